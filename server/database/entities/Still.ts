import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import { Possession } from './Possession'

/** An uploaded picture of a possession. The files are named by its id. */
@Entity('stills')
@Index(['possessionId', 'position'])
export class Still {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @Column({ type: 'varchar', length: 36 })
  teamId!: string

  @ManyToOne(() => Possession, (possession) => possession.stills, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'possessionId' })
  possession?: Relation<Possession>

  @Column({ type: 'varchar', length: 36 })
  possessionId!: string

  @Column({ type: 'integer' })
  position!: number

  /** Seconds from the first touch. */
  @Column({ type: 'real', nullable: true })
  t!: number | null

  @Column({ type: 'text' })
  caption!: string

  /** px, as stored. */
  @Column({ type: 'integer' })
  width!: number

  @Column({ type: 'integer' })
  height!: number

  /** SHA-256 of what was uploaded: the same picture sent again is told from another one. */
  @Column({ type: 'text' })
  digest!: string

  @Column({ type: 'text' })
  createdAt!: string
}
