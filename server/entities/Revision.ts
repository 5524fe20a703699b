import { Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn, Unique } from 'typeorm'
import { DatasetVersion } from './DatasetVersion.js'
import { Species } from './Species.js'

/** What was published at one moment, for ever. Its content is its items. */
@Entity('revision')
@Unique(['speciesId', 'number'])
export class Revision {
  @PrimaryGeneratedColumn('uuid') id!: string
  @Column('uuid')
  @ForeignKey(() => Species)
  speciesId!: string
  @Column('int') number!: number
  @Column('timestamptz') publishedAt!: Date
  @Column('text') summary!: string
  /** The revision that was current when this one was made. */
  @Index()
  @Column('uuid', { nullable: true })
  @ForeignKey(() => Revision)
  baseRevisionId!: string | null
  /** Of a revert: the revision whose content this one brings back. */
  @Index()
  @Column('uuid', { nullable: true })
  @ForeignKey(() => Revision)
  restoresRevisionId!: string | null
  /** `dataset` or `demonstration`. */
  @Column('text') broughtBy!: string
  @Index()
  @Column('uuid', { nullable: true })
  @ForeignKey(() => DatasetVersion)
  datasetVersionId!: string | null
}
