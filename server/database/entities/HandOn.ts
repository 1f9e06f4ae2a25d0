import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import type { Station } from '@shared/vocabulary'
import { Game } from './Game'
import { Person } from './Person'

/** The work on a game went from one to another. */
@Entity('hand_ons')
@Index(['gameId', 'at'])
@Index(['teamId', 'at'])
export class HandOn {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @Column({ type: 'varchar', length: 36 })
  teamId!: string

  @ManyToOne(() => Game, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'gameId' })
  game?: Relation<Game>

  @Column({ type: 'varchar', length: 36 })
  gameId!: string

  @Column({ type: 'text' })
  station!: Station

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'fromId' })
  from?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  fromId!: string | null

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'toId' })
  to?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  toId!: string | null

  @Column({ type: 'text', default: '' })
  note!: string

  @Column({ type: 'text' })
  at!: string
}
