import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import { TeamRow } from '../columns'
import { Team } from './Team'

/** A team we prepare against; belongs to one of our teams. */
@Entity('opponents')
@Index(['teamId'])
export class Opponent extends TeamRow {
  @ManyToOne(() => Team, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'teamId' })
  team?: Relation<Team>

  @Column({ type: 'text' })
  name!: string

  @Column({ type: 'text' })
  shortName!: string

  /** Markdown; the client renders it. */
  @Column({ type: 'text', default: '' })
  notes!: string
}
