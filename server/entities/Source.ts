import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import { SourceRevision } from './SourceRevision.js'

/** A work that pages cite, by this id for ever. What is known of it stands in its revisions. */
@Entity('source')
@Check('source_doi_check', 'doi = lower(doi)')
// Used by the list of sources: those that stand for themselves, in order of their words.
@Index('source_listing_idx', { synchronize: false })
@Index('source_listing_words_idx', { synchronize: false })
export class Source {
  @PrimaryGeneratedColumn('uuid') id!: string
  @Index({ unique: true }) @Column('text', { nullable: true }) doi!: string | null
  /** SHA-256 of the normalised full reference: the key by which two datasets' citations of one study meet. */
  @Index({ unique: true }) @Column('bytea', { nullable: true }) referenceKey!: Buffer | null
  @Column('text') kind!: string
  /** Terms of use, as the source states them. */
  @Column('text', { nullable: true }) terms!: string | null
  @Column('text', { nullable: true }) asPrinted!: string | null
  @Column('boolean') isInvented!: boolean
  /** The source that stands for this one; never itself merged. */
  @Index()
  @Column('uuid', { nullable: true })
  @ForeignKey(() => Source)
  mergedIntoId!: string | null
  /** Null only inside the transaction that saves the first revision. */
  @Index()
  @Column('uuid', { nullable: true })
  @ForeignKey(() => SourceRevision)
  currentSourceRevisionId!: string | null
  /** Projection of the current revision: first author, year and title in lower case without accents, for order and search. */
  @Column('text') listing!: string
}
