import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import { TeamRow } from '../columns'
import { Sheet } from './Sheet'
import { SquadPlayer } from './SquadPlayer'

/** One copy of a sheet: a numbered paper or a letter, whose it is, and whether it came back. */
@Entity('copies')
@Index(['sheetId', 'number'], { unique: true })
export class Copy extends TeamRow {
  @ManyToOne(() => Sheet, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'sheetId' })
  sheet?: Relation<Sheet>

  @Column({ type: 'varchar', length: 36 })
  sheetId!: string

  /** From 1 within the sheet; null for a letter. */
  @Column({ type: 'integer', nullable: true })
  number!: number | null

  @ManyToOne(() => SquadPlayer, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'squadPlayerId' })
  squadPlayer?: Relation<SquadPlayer> | null

  /** Whose role stands on it; null is a general copy. */
  @Column({ type: 'varchar', length: 36, nullable: true })
  squadPlayerId!: string | null

  @Column({ type: 'text' })
  way!: 'paper' | 'mail' | 'guardian'

  /** Paper: in the bag until it is given out. */
  @Column({ type: 'text', nullable: true })
  outAt!: string | null

  @Column({ type: 'text', nullable: true })
  backAt!: string | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  mailId!: string | null
}
