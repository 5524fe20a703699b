import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import { Dataset } from './Dataset.js'
import { RecordSet } from './RecordSet.js'
import { Source } from './Source.js'

/**
 * One state of a physiology item, addressed by its content; never changed. Of form `dataset` it names a record set; of form
 * `cited` it is one statement of one source, temperatures in °C.
 */
@Entity('physiology_row')
@Check(
  'physiology_row_form_check',
  `(form = 'dataset' and dataset_id is not null and record_set_hash is not null) or
   (form = 'cited' and quantity is not null and life_stage is not null and source_id is not null and printed_unit is not null)`,
)
export class PhysiologyRow {
  @PrimaryColumn('bytea') hash!: Buffer
  @Column('text') form!: string
  @Index()
  @Column('text', { nullable: true })
  @ForeignKey(() => Dataset)
  datasetId!: string | null
  @Index()
  @Column('bytea', { nullable: true })
  @ForeignKey(() => RecordSet)
  recordSetHash!: Buffer | null
  @Column('text', { nullable: true }) quantity!: string | null
  @Column('text', { nullable: true }) lifeStage!: string | null
  @Index()
  @Column('uuid', { nullable: true })
  @ForeignKey(() => Source)
  sourceId!: string | null
  @Column('text', { nullable: true }) locator!: string | null
  @Column('text', { nullable: true }) printedLow!: string | null
  @Column('text', { nullable: true }) printedHigh!: string | null
  @Column('text', { nullable: true }) printedMean!: string | null
  @Column('text', { nullable: true }) printedSd!: string | null
  @Column('text', { nullable: true }) printedUnit!: string | null
  @Column('double precision', { nullable: true }) meanC!: number | null
  @Column('double precision', { nullable: true }) lowC!: number | null
  @Column('double precision', { nullable: true }) highC!: number | null
  @Column('double precision', { nullable: true }) sdC!: number | null
  @Column('bigint', { nullable: true }) n!: string | null
  @Column('text', { nullable: true }) note!: string | null
}
