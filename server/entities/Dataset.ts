import { Column, Entity, PrimaryColumn } from 'typeorm'

/** An open dataset with what its licence asks to be shown. */
@Entity('dataset')
export class Dataset {
  /** A short name in lower case, as in `amphitherm`. */
  @PrimaryColumn('text') id!: string
  @Column('text') title!: string
  @Column('text', { nullable: true }) doi!: string | null
  @Column('text') licence!: string
  @Column('text', { nullable: true }) licenceUrl!: string | null
  @Column('text') attribution!: string
}
