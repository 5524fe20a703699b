import { Check, Column, Entity, PrimaryColumn } from 'typeorm'

/** One row: a number that moves with every transaction that changes what the public pages show. */
@Entity('site_epoch')
@Check('site_epoch_id_check', 'id')
export class SiteEpoch {
  @PrimaryColumn('boolean') id!: true
  @Column('bigint') number!: string
  /** The transaction that moved it last, so that a transaction of many publishings moves it once. */
  @Column('text') transactionId!: string
}
