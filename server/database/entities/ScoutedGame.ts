import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import type { RulePackKey } from '@shared/court/rulePacks'
import type { ScoutedGameBody } from '@shared/scoutedGames/schemas'
import { json, TeamRow } from '../columns'
import { Opponent } from './Opponent'
import { Person } from './Person'

/** A game of an opponent's that a scout watched, live or on film. */
@Entity('scouted_games')
@Index(['teamId'])
export class ScoutedGame extends TeamRow {
  @ManyToOne(() => Opponent, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'opponentId' })
  opponent?: Relation<Opponent>

  @Index()
  @Column({ type: 'varchar', length: 36 })
  opponentId!: string

  @Column({ type: 'text' })
  foe!: string

  /** Calendar day. */
  @Column({ type: 'text' })
  playedOn!: string

  @Column({ type: 'text' })
  seen!: 'live' | 'film'

  @Column({ type: 'text' })
  rulePack!: RulePackKey

  @Column({ type: 'text' })
  coverageKind!: ScoutedGameBody['coverage']['kind']

  /** Game minutes, only when the coverage is from minute to minute. */
  @Column({ type: 'real', nullable: true })
  coverageFrom!: number | null

  @Column({ type: 'real', nullable: true })
  coverageTo!: number | null

  @Column({ type: 'boolean' })
  blowout!: boolean

  @Column({ type: 'text', nullable: true, transformer: json })
  finalScore!: ScoutedGameBody['finalScore']

  /** Markdown; the client renders it. */
  @Column({ type: 'text', default: '' })
  notes!: string

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'scoutId' })
  scout?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  scoutId!: string | null
}
