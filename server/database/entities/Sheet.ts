import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import { Plan } from './Plan'

/** The one page that players get; belongs to one frozen plan version. Drawn anew for each reader. */
@Entity('sheets')
export class Sheet {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @Index()
  @Column({ type: 'varchar', length: 36 })
  teamId!: string

  @ManyToOne(() => Plan, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'planId' })
  plan?: Relation<Plan>

  @Index({ unique: true })
  @Column({ type: 'varchar', length: 36 })
  planId!: string

  /** The fuller page, chosen after its warning. */
  @Column({ type: 'boolean', default: false })
  fuller!: boolean

  /** Called back: readers are told that a newer one stands, paper is to be brought back. */
  @Column({ type: 'text', nullable: true })
  recalledAt!: string | null

  @Column({ type: 'text' })
  createdAt!: string
}
