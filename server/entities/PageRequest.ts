import { Column, Entity, Index, PrimaryColumn } from 'typeorm'

/** How often a page that does not exist was asked for. */
@Entity('page_request')
@Index(['times', 'normalisedName'])
export class PageRequest {
  @PrimaryColumn('text') normalisedName!: string
  /** As it was first typed. */
  @Column('text') name!: string
  @Column('int') times!: number
  @Column('timestamptz') firstAskedAt!: Date
  @Column('timestamptz') lastAskedAt!: Date
}
