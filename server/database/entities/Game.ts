import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import type { RulePackKey } from '@shared/court/rulePacks'
import { TeamRow } from '../columns'
import { Opponent } from './Opponent'

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
}
