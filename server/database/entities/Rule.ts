import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import { json, TeamRow } from '../columns'
import { Team } from './Team'

/** If a habit, a squad or a situation, then what a counter must have. */
@Entity('rules')
@Index(['teamId'])
export class Rule extends TeamRow {
  @ManyToOne(() => Team, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'teamId' })
  team?: Relation<Team>

  @Column({ type: 'integer', nullable: true })
  number!: number | null

  @Column({ type: 'boolean' })
  on!: boolean

  /** The whole RuleBody, parsed when it is read. */
  @Column({ type: 'text', transformer: json })
  body!: unknown
}
