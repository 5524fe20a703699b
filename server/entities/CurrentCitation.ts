import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import { Source } from './Source.js'
import { Species } from './Species.js'

/** Projection: the sources that current revisions cite, by the id that is cited (a merged source is resolved when read). */
@Entity('current_citation')
@Index('current_citation_listing_idx', ['sourceId', 'scientificName', 'speciesId'])
export class CurrentCitation {
  @PrimaryColumn('uuid')
  @ForeignKey(() => Source)
  sourceId!: string
  @Index()
  @PrimaryColumn('uuid')
  @ForeignKey(() => Species)
  speciesId!: string
  @Column('text') scientificName!: string
  /** Ranges with evidence from this source. */
  @Column('int') ranges!: number
  /** Records of datasets and cited statements from this source. */
  @Column('int') physiology!: number
}
