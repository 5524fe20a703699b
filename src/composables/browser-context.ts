import type { PageContext, PageState, StoredRead } from './page-context.js'

/** For how long an answer serves the way back through the history, ms. */
const FRESH_MS = 60_000
const KEPT_ANSWERS = 30

/**
 * The context of a browser tab: it begins with the answers the server left in the page, and keeps the last few of its own
 * for a minute so that going back shows the page at once and in its place.
 */
export function createBrowserContext(
  state: PageState,
  read: (path: string, signal?: AbortSignal) => Promise<unknown>,
  now: () => number = () => performance.now(),
): PageContext {
  const kept = new Map<string, { read: StoredRead; at: number }>()

  function store(stored: StoredRead): void {
    kept.delete(stored.path)
    if ('error' in stored) return
    kept.set(stored.path, { read: stored, at: now() })
    const [oldest] = kept.keys()
    if (kept.size > KEPT_ANSWERS && oldest !== undefined) kept.delete(oldest)
  }

  const given = new Map(state.reads.map((stored) => [stored.path, stored]))

  return {
    origin: state.origin,
    isServer: false,
    read,
    recall(path) {
      const first = given.get(path)
      if (first) {
        given.delete(path)
        store(first)
        return first
      }
      const held = kept.get(path)
      if (!held) return null
      if (now() - held.at <= FRESH_MS) return held.read
      kept.delete(path)
      return null
    },
    store,
    response: { status: 200, location: null },
  }
}
