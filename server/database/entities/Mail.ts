import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import type { MailAttachment, MailKind } from '@shared/mail/schemas'
import { json } from '../columns'
import { Team } from './Team'

/** A letter on its way out. Once it has left, its words are emptied: they may hold a secret link. */
@Entity('mails')
@Index(['teamId', 'createdAt'])
@Index(['state', 'nextTryAt'])
export class Mail {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @ManyToOne(() => Team, { onDelete: 'CASCADE', nullable: true })
  @JoinColumn({ name: 'teamId' })
  team?: Relation<Team> | null

  /** Null for letters that are between a person and the product (a new password). */
  @Column({ type: 'varchar', length: 36, nullable: true })
  teamId!: string | null

  @Column({ type: 'text' })
  kind!: MailKind

  /** The same key twice is the same letter: nothing is sent twice. */
  @Index({ unique: true })
  @Column({ type: 'text' })
  onceKey!: string

  /** The row that it is about (an invitation, a sheet), for its page. */
  @Column({ type: 'varchar', length: 36, nullable: true })
  aboutId!: string | null

  @Column({ type: 'text' })
  recipient!: string

  @Column({ type: 'text' })
  subject!: string

  @Column({ type: 'text' })
  text!: string

  @Column({ type: 'text' })
  html!: string

  /** Drawn when it leaves, so that no paper lies in the database. */
  @Column({ type: 'text', nullable: true, transformer: json })
  attachment!: MailAttachment | null

  /** `kept`: no mail server is set; it waits on the staff's page. */
  @Column({ type: 'text' })
  state!: 'waiting' | 'sending' | 'sent' | 'failed' | 'kept' | 'withdrawn'

  @Column({ type: 'integer', default: 0 })
  tries!: number

  @Column({ type: 'text', nullable: true })
  nextTryAt!: string | null

  /** Why the last try did not work, in our own words. */
  @Column({ type: 'text', nullable: true })
  trouble!: string | null

  @Column({ type: 'text', nullable: true })
  sentAt!: string | null

  @Column({ type: 'text' })
  createdAt!: string
}
