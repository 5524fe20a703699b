import type { CountStore, SearchCounts } from '../queries/search.js'
import type { SiteEpoch } from './site-epoch.js'

const SEARCHES_MAX = 500

/**
 * Keeps the counts of searches until anything is published. What it gives is for one request: a count that was begun in one
 * epoch is not kept for the next. Null while the epoch is unknown.
 */
export function keepCountsByEpoch(epoch: SiteEpoch): () => CountStore | null {
  const kept = new Map<string, SearchCounts>()
  let keptEpoch: string | null = null
  return () => {
    const now = epoch.current()
    if (now === null) return null
    if (now !== keptEpoch) {
      kept.clear()
      keptEpoch = now
    }
    return {
      find: (key) => kept.get(key) ?? null,
      keep(key, counts) {
        if (keptEpoch !== now || epoch.current() !== now) return
        const [oldest] = kept.keys()
        if (kept.size >= SEARCHES_MAX && oldest !== undefined) kept.delete(oldest)
        kept.set(key, counts)
      },
    }
  }
}
