import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import { json } from '../columns'
import { Person } from './Person'
import { Team } from './Team'

/** One entry in a row's history: who, when, from what to what. It goes with its row. */
@Entity('changes')
@Index(['rowId', 'at'])
@Index(['teamId', 'at'])
@Index(['batchId'])
export class Change {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @ManyToOne(() => Team, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'teamId' })
  team?: Relation<Team>

  @Column({ type: 'varchar', length: 36 })
  teamId!: string

  /** Table of the row, e.g. "possessions". */
  @Column({ type: 'text' })
  kind!: string

  @Column({ type: 'varchar', length: 36 })
  rowId!: string

  @Column({ type: 'text' })
  action!: 'made' | 'changed' | 'deleted' | 'restored'

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'personId' })
  person?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  personId!: string | null

  @Column({ type: 'text' })
  at!: string

  /** Rows that were changed together share it, and can be put back together. */
  @Column({ type: 'varchar', length: 36, nullable: true })
  batchId!: string | null

  /** Empty for anything but `changed`. */
  @Column({ type: 'text', transformer: json })
  fields!: unknown
}
