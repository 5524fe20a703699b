import { Column, Entity, Index, PrimaryColumn } from 'typeorm'

/** One state of the use of an image, addressed by its content; never changed. */
@Entity('image_row')
export class ImageRow {
  @PrimaryColumn('bytea') hash!: Buffer
  @Index() @Column('uuid') mediaId!: string
  @Column('text') alternativeText!: string
  @Column('text', { nullable: true }) caption!: string | null
  @Column('text') licence!: string
  @Column('text') credit!: string
}
