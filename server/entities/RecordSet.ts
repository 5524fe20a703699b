import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { StudyLine } from '../../shared/physiology.js'
import { DatasetVersion } from './DatasetVersion.js'
import { Dataset } from './Dataset.js'

/** All records a dataset holds for one species, addressed by their content and shared by the versions that agree; never changed. */
@Entity('record_set')
export class RecordSet {
  @PrimaryColumn('bytea') hash!: Buffer
  @Index()
  @Column('text')
  @ForeignKey(() => Dataset)
  datasetId!: string
  /** The version that first brought these records. */
  @Index()
  @Column('uuid')
  @ForeignKey(() => DatasetVersion)
  datasetVersionId!: string
  @Column('int') recordCount!: number
  /** The records as study lines, computed once. */
  @Column('json') studies!: StudyLine[]
  @Column('text', { array: true }) quantities!: string[]
  @Column('uuid', { array: true }) sourceIds!: string[]
}
