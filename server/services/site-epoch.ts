import type { EntityManager } from 'typeorm'
import { queryPrepared } from '../prepared.js'

/** The channel on which every server hears that what the public pages show has moved. */
export const SITE_EPOCH_CHANNEL = 'site_epoch'

const MOVE_SITE_EPOCH = {
  name: 'move-site-epoch',
  text: `
    with moved as (
      update site_epoch set number = number + 1, transaction_id = pg_current_xact_id()::text
      where transaction_id <> pg_current_xact_id()::text
      returning number
    )
    select pg_notify('${SITE_EPOCH_CHANNEL}', number::text) from moved`,
}

const FIND_SITE_EPOCH = { name: 'find-site-epoch', text: 'select number::text as epoch from site_epoch' }

/**
 * Moves the epoch of what the public pages show, once per transaction however often it is called, and tells every listening
 * server when the transaction commits. Publishing, sources and datasets move it by themselves, by triggers at the commit; this is
 * for what else changes a page. Call it last: until the commit everybody else's publishing waits.
 */
export async function moveSiteEpoch(db: EntityManager): Promise<void> {
  await queryPrepared(db, MOVE_SITE_EPOCH, [])
}

/** The current epoch, as a decimal number in text. */
export async function findSiteEpoch(db: EntityManager): Promise<string> {
  const [row] = await queryPrepared<{ epoch: string }>(db, FIND_SITE_EPOCH, [])
  if (row === undefined) throw new Error('The site epoch has no row: the migrations have not run')
  return row.epoch
}
