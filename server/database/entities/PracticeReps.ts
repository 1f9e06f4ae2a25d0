import { Column, Entity, Index, JoinColumn, ManyToOne, PrimaryColumn, type Relation } from 'typeorm'
import type { Shape } from '@shared/vocabulary'
import { Counter } from './Counter'
import { Practice } from './Practice'

/** Repetitions of a counter in one practice, by how hard they were and against what. */
@Entity('practice_reps')
@Index(['practiceId'])
@Index(['teamId', 'counterId'])
export class PracticeReps {
  @PrimaryColumn({ type: 'varchar', length: 36 })
  id!: string

  @Column({ type: 'varchar', length: 36 })
  teamId!: string

  @ManyToOne(() => Practice, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'practiceId' })
  practice?: Relation<Practice>

  @Column({ type: 'varchar', length: 36 })
  practiceId!: string

  @ManyToOne(() => Counter, { onDelete: 'CASCADE' })
  @JoinColumn({ name: 'counterId' })
  counter?: Relation<Counter>

  @Column({ type: 'varchar', length: 36 })
  counterId!: string

  /** The press that the scout team showed; null where it does not matter. */
  @Column({ type: 'text', nullable: true })
  shape!: Shape | null

  /** `walk`, `overload` (five against six), `live`. */
  @Column({ type: 'text' })
  kind!: 'walk' | 'overload' | 'live'

  @Column({ type: 'integer' })
  n!: number

  /** Got through; null for walked ones. */
  @Column({ type: 'integer', nullable: true })
  k!: number | null
}
