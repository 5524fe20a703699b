import pg from 'pg'
import type { Log } from '../log.js'

const CHANNEL = 'site_epoch'
const RETRY_MS = { first: 250, most: 10_000 }

/** Which epoch the published data is in, as far as this process knows. */
export interface SiteEpoch {
  /** The epoch, or null while it cannot be known: then nothing cached may be sent. */
  current(): string | null
  stop(): Promise<void>
}

/**
 * Follows the epoch by a connection of its own: reads it once, then hears of each change as it is committed. While that
 * connection is down the epoch is unknown; it is tried again ever less often, at least every ten seconds.
 */
export function followSiteEpoch(databaseUrl: string, log: Log): SiteEpoch {
  let epoch: string | null = null
  let client: pg.Client | null = null
  let timer: NodeJS.Timeout | null = null
  let isStopped = false
  let retryMs = RETRY_MS.first

  async function connect(): Promise<void> {
    const mine = new pg.Client({
      connectionString: databaseUrl,
      application_name: 'mossgauge epoch',
      keepAlive: true,
      connectionTimeoutMillis: 5_000,
    })
    client = mine
    const lose = (error?: Error) => {
      if (client !== mine) return
      client = null
      epoch = null
      mine.end().catch(() => undefined)
      if (isStopped) return
      log.warn({ err: error }, 'The epoch is not known; pages are made anew for each reader.')
      timer = setTimeout(() => void connect(), retryMs)
      timer.unref()
      retryMs = Math.min(retryMs * 2, RETRY_MS.most)
    }
    mine.on('error', lose)
    mine.on('end', () => lose())
    mine.on('notification', ({ payload }) => {
      if (client === mine && payload !== undefined) epoch = laterOf(epoch, payload)
    })
    try {
      await mine.connect()
      // Listening first: a change between the two is then heard of, not missed.
      await mine.query(`listen ${CHANNEL}`)
      const { rows } = await mine.query<{ number: string }>('select number from site_epoch')
      if (client !== mine) return
      epoch = laterOf(epoch, rows[0]?.number ?? '0')
      retryMs = RETRY_MS.first
    } catch (error) {
      lose(error instanceof Error ? error : undefined)
    }
  }

  void connect()
  return {
    current: () => epoch,
    async stop() {
      isStopped = true
      if (timer !== null) clearTimeout(timer)
      const last = client
      client = null
      epoch = null
      await last?.end().catch(() => undefined)
    },
  }
}

function laterOf(known: string | null, heard: string): string | null {
  if (!/^\d+$/.test(heard)) return known
  return known === null || BigInt(heard) > BigInt(known) ? heard : known
}
