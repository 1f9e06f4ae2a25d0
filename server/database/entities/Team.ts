import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { RulePackKey } from '@shared/court/rulePacks'

@Entity('teams')
export class Team {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @Column({ type: 'text' })
  name!: string

  /** Who they are, e.g. "U17 girls". */
  @Column({ type: 'text' })
  squadName!: string

  /** IANA name; games show in it, instants are stored in UTC. */
  @Column({ type: 'text' })
  timeZone!: string

  @Column({ type: 'text' })
  season!: string

  @Column({ type: 'text' })
  rulePack!: RulePackKey

  @Column({ type: 'text' })
  createdAt!: string
}
