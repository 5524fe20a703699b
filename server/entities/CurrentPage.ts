import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { SpeciesPage } from '../../shared/species.js'
import { Revision } from './Revision.js'
import { Species } from './Species.js'

/**
 * Projection: what the items of a page's current revision say, written as JSON once instead of at each reading. Holds only what
 * the revision alone decides; sources, datasets and the revision line are read with it.
 */
@Entity('current_page')
export class CurrentPage {
  @PrimaryColumn('uuid')
  @ForeignKey(() => Species)
  speciesId!: string
  @Index({ unique: true })
  @Column('uuid')
  @ForeignKey(() => Revision)
  revisionId!: string
  @Column('json') names!: SpeciesPage['names']
  @Column('json', { nullable: true }) classification!: SpeciesPage['classification']
  @Column('json') ranges!: SpeciesPage['ranges']
  @Column('json') prose!: SpeciesPage['prose']
  @Column('json') images!: SpeciesPage['images']
  /** Every source that an item or a record behind it cites. */
  @Column('uuid', { array: true }) sourceIds!: string[]
}
