import { Column, Entity, PrimaryColumn } from 'typeorm'

/** One state of a name item, addressed by its content; never changed. */
@Entity('name_row')
export class NameRow {
  @PrimaryColumn('bytea') hash!: Buffer
  @Column('text') kind!: string
  @Column('text') name!: string
  @Column('text', { nullable: true }) authority!: string | null
  @Column('text', { nullable: true }) status!: string | null
  @Column('text', { nullable: true }) language!: string | null
  @Column('text') provenance!: string
}
