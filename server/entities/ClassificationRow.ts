import { Column, Entity, PrimaryColumn } from 'typeorm'

/** One state of a classification item, addressed by its content; never changed. */
@Entity('classification_row')
export class ClassificationRow {
  @PrimaryColumn('bytea') hash!: Buffer
  @Column('text') class!: string
  @Column('text', { nullable: true }) order!: string | null
  @Column('text', { nullable: true }) suborder!: string | null
  @Column('text', { nullable: true }) family!: string | null
  @Column('text', { nullable: true }) conservation!: string | null
  @Column('text', { nullable: true }) activeTime!: string | null
  @Column('text', { nullable: true }) microhabitat!: string | null
  @Column('text', { nullable: true }) region!: string | null
  @Column('text') provenance!: string
}
