import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import { json, TeamRow } from '../columns'
import { Game } from './Game'

/** A practice that teaches a plan: its script, and afterwards what was run (PracticeReps). */
@Entity('practices')
@Index(['teamId', 'startsAt'])
export class Practice extends TeamRow {
  @ManyToOne(() => Game, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'gameId' })
  game?: Relation<Game>

  @Index()
  @Column({ type: 'varchar', length: 36 })
  gameId!: string

  @Column({ type: 'text' })
  startsAt!: string

  /** The whole PracticeBody, parsed when it is read. */
  @Column({ type: 'text', transformer: json })
  body!: unknown
}
