import { Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn, Unique } from 'typeorm'
import type { CslItem } from '../../shared/sources.js'
import { DatasetVersion } from './DatasetVersion.js'
import { Source } from './Source.js'

/** What was published of a source at one moment, for ever. */
@Entity('source_revision')
@Unique(['sourceId', 'number'])
export class SourceRevision {
  @PrimaryGeneratedColumn('uuid') id!: string
  @Column('uuid')
  @ForeignKey(() => Source)
  sourceId!: string
  @Column('int') number!: number
  @Column('json') csl!: CslItem
  @Column('timestamptz') publishedAt!: Date
  /** `dataset` or `demonstration`. */
  @Column('text') broughtBy!: string
  @Index()
  @Column('uuid', { nullable: true })
  @ForeignKey(() => DatasetVersion)
  datasetVersionId!: string | null
}
