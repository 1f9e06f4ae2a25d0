import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import type { OpponentPlayerBody } from '@shared/opponents/players'
import { json, TeamRow } from '../columns'
import { Opponent } from './Opponent'

/** One of theirs, by shirt number only: no name is kept. */
@Entity('opponent_players')
@Index(['opponentId', 'jersey'], { unique: true, where: '"deletedAt" IS NULL' })
export class OpponentPlayer extends TeamRow {
  @ManyToOne(() => Opponent, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'opponentId' })
  opponent?: Relation<Opponent>

  @Column({ type: 'varchar', length: 36 })
  opponentId!: string

  @Column({ type: 'integer' })
  jersey!: number

  /** What she does in the press; closed list. */
  @Column({ type: 'text', transformer: json })
  does!: OpponentPlayerBody['does']

  @Column({ type: 'text', default: '' })
  note!: string
}
