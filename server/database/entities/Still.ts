import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import { json } from '../columns'
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

  /** Ring, shade and pass drawn over it; StillMarks, parsed when it is read. */
  @Column({ type: 'text', nullable: true, transformer: json })
  marks!: unknown

  /** Regions burned into the picture; what was under them is gone. */
  @Column({ type: 'integer', default: 0 })
  blurred!: number

  /** Faces that can still be made out, as somebody counted them; null: nobody has looked. */
  @Column({ type: 'integer', nullable: true })
  facesLeft!: number | null

  /** Chosen for the staff's report. */
  @Column({ type: 'boolean', default: false })
  inReport!: boolean

  /** Calendar day in the team's zone; the picture and its files are gone the day after. */
  @Column({ type: 'text', nullable: true })
  expiresOn!: string | null

  /** Number inside the ETag. */
  @Column({ type: 'integer', default: 1 })
  version!: number

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
