import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import type { TeamRole } from '@shared/vocabulary'
import { Person } from './Person'
import { SquadPlayer } from './SquadPlayer'
import { Team } from './Team'

/** A person's role in one team. */
@Entity('memberships')
@Index(['personId', 'teamId'], { unique: true })
export class Membership {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @ManyToOne(() => Team, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'teamId' })
  team?: Relation<Team>

  @Column({ type: 'varchar', length: 36 })
  teamId!: string

  @ManyToOne(() => Person, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'personId' })
  person?: Relation<Person>

  @Column({ type: 'varchar', length: 36 })
  personId!: string

  @Column({ type: 'text' })
  role!: TeamRole

  @ManyToOne(() => SquadPlayer, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'squadPlayerId' })
  squadPlayer?: Relation<SquadPlayer> | null

  /** The squad player that this account belongs to, for the role player. */
  @Column({ type: 'varchar', length: 36, nullable: true })
  squadPlayerId!: string | null

  /** Sheets and reminders go to this person's address. */
  @Column({ type: 'boolean', default: true })
  mail!: boolean

  @Column({ type: 'integer', default: 1 })
  version!: number

  @Column({ type: 'text', nullable: true })
  createdAt!: string | null
}
