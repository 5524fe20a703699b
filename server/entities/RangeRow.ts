import { Column, Entity, PrimaryColumn } from 'typeorm'

/** One state of a range item, addressed by its content; never changed. Canonical units (°C, % RH, UV index, h). */
@Entity('range_row')
export class RangeRow {
  @PrimaryColumn('bytea') hash!: Buffer
  @Column('text') parameter!: string
  @Column('text') position!: string
  @Column('text') period!: string
  @Column('text') season!: string
  @Column('text') lifeStage!: string
  @Column('double precision', { nullable: true }) low!: number | null
  @Column('double precision', { nullable: true }) high!: number | null
  @Column('double precision', { nullable: true }) lowerLimit!: number | null
  @Column('double precision', { nullable: true }) upperLimit!: number | null
  @Column('text') typedUnit!: string
  /** Whether the row says how its bounds were typed; tells "none typed" from "typed, all empty". */
  @Column('boolean') hasTyped!: boolean
  @Column('text', { nullable: true }) typedLow!: string | null
  @Column('text', { nullable: true }) typedHigh!: string | null
  @Column('text', { nullable: true }) typedLowerLimit!: string | null
  @Column('text', { nullable: true }) typedUpperLimit!: string | null
  @Column('text', { nullable: true }) uvMeaning!: string | null
  @Column('smallint', { nullable: true }) uvZone!: number | null
  @Column('text', { nullable: true }) note!: string | null
}
