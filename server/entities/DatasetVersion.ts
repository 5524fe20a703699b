import { Column, Entity, ForeignKey, PrimaryGeneratedColumn, Unique } from 'typeorm'
import { Dataset } from './Dataset.js'

/** A row of a dataset's file that was not taken over, by its line in the file. */
export interface RejectedLine {
  line: number
  reason: string
}

/** One imported file of a dataset, with the account of what became of its rows. */
@Entity('dataset_version')
@Unique(['datasetId', 'fileSha256'])
export class DatasetVersion {
  @PrimaryGeneratedColumn('uuid') id!: string
  @Column('text')
  @ForeignKey(() => Dataset)
  datasetId!: string
  @Column('text') version!: string
  @Column('bytea') fileSha256!: Buffer
  @Column('timestamptz') importedAt!: Date
  @Column('int') rowsRead!: number
  @Column('int') rowsAccepted!: number
  @Column('int') rowsMerged!: number
  @Column('int') rowsRejected!: number
  @Column('jsonb') rejected!: RejectedLine[]
}
