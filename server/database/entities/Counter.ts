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

  /** Still being drawn: kept with its faults, never offered, not in the library. */
  @Column({ type: 'boolean', default: false })
  draft!: boolean

  /** Taken out of the library but kept, with its record. */
  @Column({ type: 'text', nullable: true })
  archivedAt!: string | null

  /** When somebody last walked it on the screen. */
  @Column({ type: 'text', nullable: true })
  walkedAt!: string | null

  /** The whole CounterBody, parsed and mended when it is read. */
  @Column({ type: 'text', transformer: json })
  body!: unknown
}
