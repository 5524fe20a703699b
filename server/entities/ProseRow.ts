import { Column, Entity, PrimaryColumn } from 'typeorm'

/** One state of a section of prose, addressed by its content; never changed. */
@Entity('prose_row')
export class ProseRow {
  @PrimaryColumn('bytea') hash!: Buffer
  @Column('text') heading!: string
  @Column('text') markdown!: string
  /** The sources its text cites, read from the text once; no part of the content. */
  @Column('uuid', { array: true }) sourceIds!: string[]
}
