import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import { Species } from './Species.js'

/** Projection: the names of current revisions, as the name search reads them. */
@Entity('species_name')
@Index('species_name_normalised_name_idx', { synchronize: false })
@Index('species_name_prefix_idx', { synchronize: false })
export class SpeciesName {
  @PrimaryColumn('uuid')
  @ForeignKey(() => Species)
  speciesId!: string
  @PrimaryColumn('uuid') itemId!: string
  @Column('text') kind!: string
  @Column('text') name!: string
  /** As the database function `normalise_name` writes it. */
  @Column('text') normalisedName!: string
  @Column('text', { nullable: true }) language!: string | null
  @Column('int') ordinal!: number
}
