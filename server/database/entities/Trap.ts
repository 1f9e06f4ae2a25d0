import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import type { Trap as TrapBody } from '@shared/possessions/schemas'
import { json } from '../columns'
import { Possession } from './Possession'

/** Where two came to the ball. The spot follows from x and y and is never stored. */
@Entity('traps')
@Index(['possessionId', 'position'], { unique: true })
export class Trap {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @ManyToOne(() => Possession, (possession) => possession.traps, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'possessionId' })
  possession?: Relation<Possession>

  @Column({ type: 'varchar', length: 36 })
  possessionId!: string

  /** Order in the possession, from 1. */
  @Column({ type: 'integer' })
  position!: number

  /** Fractions of the landmark court. */
  @Column({ type: 'real' })
  x!: number

  @Column({ type: 'real' })
  y!: number

  /** Seconds from the first touch. */
  @Column({ type: 'real', nullable: true })
  t!: number | null

  @Column({ type: 'text', nullable: true })
  cue!: TrapBody['cue']

  /** Shirt numbers of the two (or three) who came. */
  @Column({ type: 'text', nullable: true, transformer: json })
  trappers!: TrapBody['trappers']

  @Column({ type: 'text', nullable: true })
  result!: TrapBody['result']
}
