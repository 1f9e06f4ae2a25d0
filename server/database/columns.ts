import { Column, PrimaryColumn, type ValueTransformer } from 'typeorm'

/** JSON in a text column; null stays null. What comes out is parsed by the feature's presenter. */
export const json: ValueTransformer = {
  to: (value: unknown) => (value === null || value === undefined ? null : JSON.stringify(value)),
  from: (text: string | null): unknown => (text === null ? null : JSON.parse(text)),
}

/** What every row of a team carries. Instants are RFC 3339 text in UTC. */
export abstract class TeamRow {
  /** UUID made by whoever created the row. */
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @Column({ type: 'varchar', length: 36 })
  teamId!: string

  /** Number inside the ETag; goes up by one with every change. */
  @Column({ type: 'integer' })
  version!: number

  @Column({ type: 'text' })
  createdAt!: string

  @Column({ type: 'text' })
  updatedAt!: string

  /** Set while a deletion can still be undone; then the row is really gone. */
  @Column({ type: 'text', nullable: true })
  deletedAt!: string | null
}
