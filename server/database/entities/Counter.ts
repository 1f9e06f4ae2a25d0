import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import type { CounterBody } from '@shared/counters/schemas'
import { json, TeamRow } from '../columns'
import { Team } from './Team'

/** A set in our library that beats a press. */
@Entity('counters')
@Index(['teamId'])
export class Counter extends TeamRow {
  @ManyToOne(() => Team, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'teamId' })
  team?: Relation<Team>

  @Column({ type: 'text' })
  name!: string

  @Column({ type: 'text' })
  family!: CounterBody['family']

  /** The whole CounterBody, parsed and mended when it is read. */
  @Column({ type: 'text', transformer: json })
  body!: unknown
}
