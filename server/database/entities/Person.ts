import { Column, Entity, Index, PrimaryColumn } from 'typeorm'

/** Somebody who signs in. A squad player is not an account (SquadPlayer). */
@Entity('people')
export class Person {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  /** Lower case. */
  @Index({ unique: true })
  @Column({ type: 'text' })
  email!: string

  @Column({ type: 'text' })
  name!: string

  /** argon2id, with its salt and settings. */
  @Column({ type: 'text' })
  passwordHash!: string

  @Column({ type: 'text' })
  createdAt!: string
}
