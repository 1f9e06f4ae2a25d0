import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import type { Skills } from '@shared/squad/schemas'
import { json, TeamRow } from '../columns'
import { Team } from './Team'

/** Often a minor: a number, a name and what she can do in a counter; nothing else is kept. */
@Entity('squad_players')
@Index(['teamId', 'jersey'], { unique: true, where: '"deletedAt" IS NULL' })
export class SquadPlayer extends TeamRow {
  @ManyToOne(() => Team, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'teamId' })
  team?: Relation<Team>

  @Column({ type: 'integer' })
  jersey!: number

  @Column({ type: 'text' })
  firstName!: string

  @Column({ type: 'text' })
  lastName!: string

  @Column({ type: 'text', transformer: json })
  skills!: Skills

  /** Calendar day in the team's zone; null is available. */
  @Column({ type: 'text', nullable: true })
  outUntil!: string | null

  /** Where invitations and sheets go for a minor; nobody but staff sees it. */
  @Column({ type: 'text', nullable: true })
  guardianEmail!: string | null

  /** What the guardian said to pictures of her; anything but yes is no. */
  @Column({ type: 'text', default: 'not-asked' })
  pictureConsent!: 'yes' | 'no' | 'not-asked'

  /** Seconds over 20 m from a standing start, where it was measured. */
  @Column({ type: 'real', nullable: true })
  sprint20!: number | null
}
