import { Column, Entity, Index, PrimaryColumn } from 'typeorm'

@Entity('sessions')
export class StoredSession {
  @PrimaryColumn({ type: 'text' })
  id!: string

  /** express-session's own JSON. */
  @Column({ type: 'text' })
  data!: string

  /** Unix milliseconds. */
  @Index()
  @Column({ type: 'integer' })
  expiresAt!: number
}
