import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import { Species } from './Species.js'

/**
 * Projection: which range of a current revision answers which question, as `selectRanges` of the checker would choose for some
 * season and life stage. `position` and `period` are the question's; `any` asks "by day or by night". One range stands here
 * once for each question it answers, so that an overlap filter is one look into one index.
 */
@Entity('current_range')
@Index('current_range_span_idx', { synchronize: false })
@Index('current_range_species_idx', ['speciesId', 'parameter', 'position', 'period'])
export class CurrentRange {
  @PrimaryColumn('uuid')
  @ForeignKey(() => Species)
  speciesId!: string
  @PrimaryColumn('uuid') itemId!: string
  @PrimaryColumn('text') position!: string
  @PrimaryColumn('text') period!: string
  @Column('text') parameter!: string
  /** The position and period the range itself names. */
  @Column('text') statedPosition!: string
  @Column('text') statedPeriod!: string
  @Column('text') season!: string
  @Column('text') lifeStage!: string
  @Column('text', { nullable: true }) uvMeaning!: string | null
  @Column('double precision', { nullable: true }) low!: number | null
  @Column('double precision', { nullable: true }) high!: number | null
  @Column('double precision', { nullable: true }) lowerLimit!: number | null
  @Column('double precision', { nullable: true }) upperLimit!: number | null
  /** [low, high], a missing side open; null when the range has limits only. */
  @Column('numrange', { nullable: true }) span!: string | null
}
