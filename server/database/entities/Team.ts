import { Column, Entity, PrimaryColumn } from 'typeorm'
import type { RulePackKey } from '@shared/court/rulePacks'
import { json } from '../columns'

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

  /** TeamSettings: figures that the head coach has set; what is missing has its default. */
  @Column({ type: 'text', nullable: true, transformer: json })
  settings!: unknown

  /** Number inside the ETag of the settings. */
  @Column({ type: 'integer', default: 1 })
  version!: number

  @Column({ type: 'text' })
  createdAt!: string
}
