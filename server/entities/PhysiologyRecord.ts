import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import { RecordSet } from './RecordSet.js'
import { Source } from './Source.js'

/** One record of a record set, as its dataset prints it; temperatures in °C; never changed. */
@Entity('physiology_record')
export class PhysiologyRecord {
  @PrimaryColumn('bytea')
  @ForeignKey(() => RecordSet)
  setHash!: Buffer
  /** Its place in the set, from 0. */
  @PrimaryColumn('int') ordinal!: number
  @Index() @Column('text') recordId!: string
  @Column('text') nameAsPrinted!: string
  @Column('text') quantity!: string
  @Column('smallint', { nullable: true }) lethalPercent!: number | null
  @Column('text') lifeStage!: string
  @Column('double precision', { nullable: true }) meanC!: number | null
  @Column('double precision', { nullable: true }) lowC!: number | null
  @Column('double precision', { nullable: true }) highC!: number | null
  @Column('double precision', { nullable: true }) sdC!: number | null
  @Column('double precision', { nullable: true }) seC!: number | null
  @Column('bigint', { nullable: true }) n!: string | null
  @Column('text') level!: string
  @Index()
  @Column('uuid', { nullable: true })
  @ForeignKey(() => Source)
  sourceId!: string | null
  @Column('text') sourceAsPrinted!: string
  @Column('jsonb') facts!: Record<string, string>
}
