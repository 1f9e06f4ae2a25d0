import { Column, Entity, Index, JoinColumn, ManyToOne, type Relation } from 'typeorm'
import type { TeamRole } from '@shared/vocabulary'
import { TeamRow } from '../columns'
import { Person } from './Person'
import { SquadPlayer } from './SquadPlayer'
import { Team } from './Team'

/** A way into a team, once, until a day. The link's secret is kept as its digest only. */
@Entity('invitations')
@Index(['teamId'])
export class Invitation extends TeamRow {
  @ManyToOne(() => Team, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'teamId' })
  team?: Relation<Team>

  @Column({ type: 'text' })
  role!: TeamRole

  @ManyToOne(() => SquadPlayer, { onDelete: 'CASCADE', nullable: true })
  @JoinColumn({ name: 'squadPlayerId' })
  squadPlayer?: Relation<SquadPlayer> | null

  /** For the role player: whose account it makes. */
  @Column({ type: 'varchar', length: 36, nullable: true })
  squadPlayerId!: string | null

  /** Where it was sent; null when the link was copied. */
  @Column({ type: 'text', nullable: true })
  email!: string | null

  /** SHA-256 of the secret in the link. */
  @Index({ unique: true })
  @Column({ type: 'text' })
  tokenHash!: string

  @Column({ type: 'text' })
  expiresAt!: string

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'invitedById' })
  invitedBy?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  invitedById!: string | null

  @Column({ type: 'text', nullable: true })
  usedAt!: string | null

  @ManyToOne(() => Person, { onDelete: 'SET NULL', nullable: true })
  @JoinColumn({ name: 'usedById' })
  usedBy?: Relation<Person> | null

  @Column({ type: 'varchar', length: 36, nullable: true })
  usedById!: string | null

  @Column({ type: 'text', nullable: true })
  revokedAt!: string | null
}
