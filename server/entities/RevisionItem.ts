import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import { Revision } from './Revision.js'

/** One item of a revision's content: which item, where it stands, and which row is its state. */
@Entity('revision_item')
@Index(['itemId', 'rowHash'])
export class RevisionItem {
  @PrimaryColumn('uuid')
  @ForeignKey(() => Revision)
  revisionId!: string
  @PrimaryColumn('uuid') itemId!: string
  @Column('text') kind!: string
  @Column('uuid', { nullable: true }) parentItemId!: string | null
  @Column('int') ordinal!: number
  /** The row's hash; `kind` says in which table it stands. */
  @Index() @Column('bytea') rowHash!: Buffer
}
