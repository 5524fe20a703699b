import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import { Source } from './Source.js'

/** One state of an evidence item, addressed by its content; never changed. Printed numbers beside canonical ones. */
@Entity('evidence_row')
export class EvidenceRow {
  @PrimaryColumn('bytea') hash!: Buffer
  @Index()
  @Column('uuid')
  @ForeignKey(() => Source)
  sourceId!: string
  @Column('text') kind!: string
  @Column('text', { nullable: true }) locator!: string | null
  @Column('text') statement!: string
  @Column('text', { nullable: true }) printedLow!: string | null
  @Column('text', { nullable: true }) printedHigh!: string | null
  @Column('text', { nullable: true }) printedMean!: string | null
  @Column('text', { nullable: true }) printedSd!: string | null
  @Column('text') printedUnit!: string
  @Column('double precision', { nullable: true }) low!: number | null
  @Column('double precision', { nullable: true }) high!: number | null
  @Column('double precision', { nullable: true }) mean!: number | null
  @Column('double precision', { nullable: true }) sd!: number | null
  @Column('bigint', { nullable: true }) n!: string | null
  @Column('text', { nullable: true }) note!: string | null
}
