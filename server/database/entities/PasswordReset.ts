import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import { Person } from './Person'

/** A link to a new password: once, for an hour. Its secret is kept as its digest only. */
@Entity('password_resets')
export class PasswordReset {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @ManyToOne(() => Person, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'personId' })
  person?: Relation<Person>

  @Index()
  @Column({ type: 'varchar', length: 36 })
  personId!: string

  /** SHA-256 of the secret in the link. */
  @Index({ unique: true })
  @Column({ type: 'text' })
  tokenHash!: string

  @Column({ type: 'text' })
  createdAt!: string

  @Column({ type: 'text' })
  expiresAt!: string

  @Column({ type: 'text', nullable: true })
  usedAt!: string | null
}
