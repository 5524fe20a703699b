import { Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import { Revision } from './Revision.js'

/**
 * A species page. All but id, slug, isInvented and the pointer are projections of the current revision, kept here so that a
 * listing reads one table; only publishing and rebuilding write them.
 */
@Entity('species')
// Expressions and operator classes that TypeORM cannot describe; the migration creates them.
@Index('species_listing_idx', { synchronize: false })
@Index('species_newest_idx', { synchronize: false })
@Index('species_wanting_idx', { synchronize: false })
@Index('species_search_idx', { synchronize: false })
@Index('species_evidence_kinds_idx', { synchronize: false })
export class Species {
  @PrimaryGeneratedColumn('uuid') id!: string
  @Index({ unique: true }) @Column('text') slug!: string
  @Index() @Column('boolean') isInvented!: boolean
  /** Null only inside the transaction that publishes the first revision. */
  @Index()
  @Column('uuid', { nullable: true })
  @ForeignKey(() => Revision)
  currentRevisionId!: string | null
  @Column('int') revisionNumber!: number
  @Column('timestamptz') updatedAt!: Date
  @Index() @Column('text') scientificName!: string
  @Column('text', { array: true }) commonNames!: string[]
  @Index() @Column('text') class!: string
  @Index() @Column('text', { nullable: true }) order!: string | null
  @Index() @Column('text', { nullable: true }) family!: string | null
  @Index() @Column('text', { nullable: true }) conservation!: string | null
  @Column('int') rangeCount!: number
  /** Records of datasets and cited statements together. */
  @Column('int') physiologyCount!: number
  @Index() @Column('smallint', { nullable: true }) uvZone!: number | null
  @Column('text', { array: true }) evidenceKinds!: string[]
  /** Every name of the page as `normalise_name` writes it, one a line. */
  @Column('text') search!: string
}
