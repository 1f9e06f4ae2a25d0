import { Check, Column, Entity, Index, JoinColumn, ManyToOne, OneToMany, type Relation } from 'typeorm'
import type { PossessionBody } from '@shared/possessions/schemas'
import { json, TeamRow } from '../columns'
import { Counter } from './Counter'
import { Game } from './Game'
import { ScoutedGame } from './ScoutedGame'
import { Still } from './Still'
import { Trap } from './Trap'

/**
 * One live ball in the offence's backcourt, pressed or not: the unit of evidence (RECORD.md section 1).
 * Belongs to exactly one scouted game or one of our games.
 */
@Entity('possessions')
@Check('("scoutedGameId" IS NULL) <> ("gameId" IS NULL)')
@Index(['scoutedGameId', 'number'])
@Index(['gameId', 'number'])
@Index(['teamId', 'counterId'])
@Index(['deletedAt'])
export class Possession extends TeamRow {
  @ManyToOne(() => ScoutedGame, { onDelete: 'CASCADE', nullable: true })
  @JoinColumn({ name: 'scoutedGameId' })
  scoutedGame?: Relation<ScoutedGame> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  scoutedGameId!: string | null

  @ManyToOne(() => Game, { onDelete: 'CASCADE', nullable: true })
  @JoinColumn({ name: 'gameId' })
  game?: Relation<Game> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  gameId!: string | null

  /** The landmark court that places are fractions of. */
  @Column({ type: 'integer' })
  frame!: 1

  @Column({ type: 'varchar', length: 36, nullable: true })
  tripId!: string | null

  @Column({ type: 'integer' })
  number!: number

  @Column({ type: 'integer', nullable: true })
  period!: number | null

  /** Tenths of a second left in the period. */
  @Column({ type: 'integer', nullable: true })
  clock!: number | null

  @Column({ type: 'integer', nullable: true })
  margin!: number | null

  @Column({ type: 'text' })
  trigger!: PossessionBody['trigger']

  @Column({ type: 'text', nullable: true })
  shape!: PossessionBody['shape']

  @Column({ type: 'text', nullable: true })
  shapeVariant!: PossessionBody['shapeVariant']

  @Column({ type: 'text', nullable: true })
  pickup!: PossessionBody['pickup']

  /** Whether traps were looked for: null not logged, `seen` (none or some, in table traps), `not-visible`. */
  @Column({ type: 'text', nullable: true })
  trapsLogged!: 'seen' | 'not-visible' | null

  @OneToMany(() => Trap, (trap) => trap.possession)
  traps?: Relation<Trap>[]

  @Column({ type: 'text', nullable: true })
  outcome!: PossessionBody['outcome']

  @Column({ type: 'text', nullable: true })
  outcomePlace!: PossessionBody['outcomePlace']

  @Column({ type: 'text', nullable: true })
  throwerGuard!: PossessionBody['throwerGuard']

  @Column({ type: 'text', nullable: true, transformer: json })
  denied!: PossessionBody['denied']

  @Column({ type: 'text', nullable: true, transformer: json })
  tookAway!: PossessionBody['tookAway']

  @Column({ type: 'text', nullable: true, transformer: json })
  leftOpen!: PossessionBody['leftOpen']

  @Column({ type: 'text', nullable: true })
  onBall!: PossessionBody['onBall']

  @Column({ type: 'text', nullable: true })
  handler!: PossessionBody['handler']

  @Column({ type: 'text', nullable: true })
  goalie!: PossessionBody['goalie']

  @Column({ type: 'text', nullable: true })
  shownShape!: PossessionBody['shownShape']

  @Column({ type: 'text', nullable: true })
  forcedSide!: PossessionBody['forcedSide']

  /** Where the first catch was, fractions of the landmark court; its spot is worked out when it is read. */
  @Column({ type: 'text', nullable: true, transformer: json })
  entrySpot!: PossessionBody['entrySpot']

  /** Shirt number of whoever caught the throw-in. */
  @Column({ type: 'text', nullable: true, transformer: json })
  receiver!: PossessionBody['receiver']

  /** Shirt numbers of the five who pressed. */
  @Column({ type: 'text', nullable: true, transformer: json })
  onFloor!: PossessionBody['onFloor']

  /** Shirt number of whoever took the ball. */
  @Column({ type: 'text', nullable: true, transformer: json })
  thief!: PossessionBody['thief']

  @Column({ type: 'integer', nullable: true })
  passes!: number | null

  @Column({ type: 'integer', nullable: true })
  reversals!: number | null

  @Column({ type: 'text', nullable: true })
  fallback!: PossessionBody['fallback']

  @Column({ type: 'text', nullable: true })
  finish!: PossessionBody['finish']

  /** Scored by the offence before its control ended, free throws with them. */
  @Column({ type: 'integer', nullable: true })
  points!: number | null

  /** Scored by the pressing team within eight seconds of a live loss. */
  @Column({ type: 'integer', nullable: true })
  pointsAgainst!: number | null

  @Column({ type: 'boolean', nullable: true })
  timeOutBurned!: boolean | null

  /** Seconds from the start of the film. */
  @Column({ type: 'real', nullable: true })
  filmTime!: number | null

  /** Seconds from the first touch. */
  @Column({ type: 'real', nullable: true })
  crossedAt!: number | null

  @Column({ type: 'text', nullable: true, transformer: json })
  track!: PossessionBody['track']

  @Column({ type: 'text' })
  note!: string

  @ManyToOne(() => Counter, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'counterId' })
  counter?: Relation<Counter> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  counterId!: string | null

  @Column({ type: 'boolean', nullable: true })
  rightCall!: boolean | null

  @Column({ type: 'boolean', nullable: true })
  runWell!: boolean | null

  @OneToMany(() => Still, (still) => still.possession)
  stills?: Relation<Still>[]
}
