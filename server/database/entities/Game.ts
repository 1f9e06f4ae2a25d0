import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import type { RulePackKey } from '@shared/court/rulePacks'
import type { GameBody } from '@shared/games/schemas'
import { json, TeamRow } from '../columns'
import { Opponent } from './Opponent'
import { Person } from './Person'

/** One of our own games against an opponent. */
@Entity('games')
@Index(['teamId', 'tipOff'])
export class Game extends TeamRow {
  @ManyToOne(() => Opponent, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'opponentId' })
  opponent?: Relation<Opponent>

  @Index()
  @Column({ type: 'varchar', length: 36 })
  opponentId!: string

  @Column({ type: 'text' })
  tipOff!: string

  @Column({ type: 'text' })
  place!: 'home' | 'away' | 'neutral'

  @Column({ type: 'text' })
  rulePack!: RulePackKey

  @Column({ type: 'text', nullable: true })
  chooseBy!: string | null

  /** When the other stations are due; a station that is missing has no date. */
  @Column({ type: 'text', nullable: true, transformer: json })
  due!: GameBody['due'] | null

  /** Whoever has the ball; null is whoever the station is usually with. */
  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'holderId' })
  holder?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  holderId!: string | null

  /** The read is signed off: what is habit is decided. */
  @Column({ type: 'text', nullable: true })
  readAt!: string | null

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'readById' })
  readBy?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  readById!: string | null

  /** Markdown; the client renders it. */
  @Column({ type: 'text', default: '' })
  notes!: string
}
