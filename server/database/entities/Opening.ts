import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import { Person } from './Person'
import { Sheet } from './Sheet'

/** That somebody has opened a sheet; for staff only. */
@Entity('openings')
@Index(['sheetId', 'personId'], { unique: true })
export class Opening {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @Column({ type: 'varchar', length: 36 })
  teamId!: string

  @ManyToOne(() => Sheet, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'sheetId' })
  sheet?: Relation<Sheet>

  @Column({ type: 'varchar', length: 36 })
  sheetId!: string

  @ManyToOne(() => Person, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'personId' })
  person?: Relation<Person>

  @Column({ type: 'varchar', length: 36 })
  personId!: string

  @Column({ type: 'text' })
  firstAt!: string

  @Column({ type: 'text' })
  lastAt!: string
}
