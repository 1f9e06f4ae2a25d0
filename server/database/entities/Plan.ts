import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import type { PlanRow } from '@shared/plans/schemas'
import { json, TeamRow } from '../columns'
import { Game } from './Game'
import { Person } from './Person'

/** One version of the head coach's picks for a game. Signing off freezes it. */
@Entity('plans')
@Index(['gameId', 'number'], { unique: true })
export class Plan extends TeamRow {
  @ManyToOne(() => Game, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'gameId' })
  game?: Relation<Game>

  @Column({ type: 'varchar', length: 36 })
  gameId!: string

  @Column({ type: 'integer' })
  number!: number

  @Column({ type: 'varchar', length: 36, nullable: true })
  firstCallId!: string | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  changeUpId!: string | null

  @Column({ type: 'text', transformer: json })
  notThisGame!: string[]

  @Column({ type: 'text', transformer: json })
  roles!: PlanRow['roles']

  @Column({ type: 'text', transformer: json })
  keys!: string[]

  @Column({ type: 'text' })
  reason!: string

  /** FrozenPlan, from the moment of signing off; holds no player's name. */
  @Column({ type: 'text', nullable: true, transformer: json })
  frozen!: unknown

  @Column({ type: 'text', nullable: true })
  signedAt!: string | null

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'signedById' })
  signedBy?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  signedById!: string | null
}
