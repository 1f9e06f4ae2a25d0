import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import { TeamRow } from '../columns'
import { Person } from './Person'
import { Team } from './Team'

/** Somebody is to be erased everywhere at the next midnight of the team; until then it can be stopped. */
@Entity('erasures')
@Index(['teamId'])
@Index(['dueAt'])
export class Erasure extends TeamRow {
  @ManyToOne(() => Team, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'teamId' })
  team?: Relation<Team>

  /** A squad player, or the account of a member. */
  @Column({ type: 'text' })
  kind!: 'squad-player' | 'member'

  /** Squad player's or person's id. */
  @Column({ type: 'varchar', length: 36 })
  subjectId!: string

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'askedById' })
  askedBy?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  askedById!: string | null

  @Column({ type: 'text' })
  dueAt!: string

  @Column({ type: 'text', nullable: true })
  stoppedAt!: string | null

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'stoppedById' })
  stoppedBy?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  stoppedById!: string | null

  @Column({ type: 'text', nullable: true })
  doneAt!: string | null
}
