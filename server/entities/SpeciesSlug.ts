import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import { Species } from './Species.js'

/** Every slug a page ever had, so that an old address still leads to it. */
@Entity('species_slug')
export class SpeciesSlug {
  @PrimaryColumn('text') slug!: string
  @Index()
  @Column('uuid')
  @ForeignKey(() => Species)
  speciesId!: string
}
