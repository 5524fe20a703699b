import { onScopeDispose, onServerPrefetch, ref, shallowRef, watch, type Ref, type ShallowRef } from 'vue'
import { ApiError, toApiError } from '../api/api-error.js'
import { usePageContext, type StoredRead } from './page-context.js'

export type ReadState = 'idle' | 'loading' | 'done' | 'error'

export interface ReadResult<T> {
  state: Ref<ReadState>
  data: ShallowRef<T | null>
  error: ShallowRef<ApiError | null>
  reload: () => Promise<void>
}

export interface ReadOptions {
  /** Keep showing the last answer while another is on its way (lists that are refined). */
  keepsLast?: boolean
  /** A part the page can do without: its failure does not become the status of the page. */
  isOptional?: boolean
}

/**
 * Reads `path()` below /api/v1, and again whenever it changes; null reads nothing. On the server the page waits for it
 * and carries the answer along, the browser's first look takes it from there. An answer that arrives after its question
 * has changed is dropped.
 */
export function useRead<T>(path: () => string | null, options: ReadOptions = {}): ReadResult<T> {
  const context = usePageContext()
  const state = ref<ReadState>('idle')
  const data = shallowRef<T | null>(null)
  const error = shallowRef<ApiError | null>(null)
  let running: AbortController | null = null

  function adopt(read: StoredRead): void {
    if ('error' in read) {
      const { status, code, message } = read.error
      error.value = new ApiError(status, code, message)
      if (!options.keepsLast) data.value = null
      state.value = 'error'
      if (!options.isOptional) context.response.status = status === 0 ? 503 : status
      return
    }
    // The shape of our own API's answers is held by its tests, not read again here.
    data.value = read.answer as T
    error.value = null
    state.value = 'done'
  }

  async function load(wanted: string): Promise<void> {
    running?.abort()
    const mine = new AbortController()
    running = mine
    state.value = 'loading'
    error.value = null
    if (!options.keepsLast) data.value = null
    let read: StoredRead
    try {
      read = { path: wanted, answer: await context.read(wanted, mine.signal) }
    } catch (thrown) {
      const { status, code, message } = toApiError(thrown)
      read = { path: wanted, error: { status, code, message } }
    }
    if (running !== mine || mine.signal.aborted) return
    context.store(read)
    adopt(read)
  }

  function follow(wanted: string | null): void {
    if (wanted === null) {
      running?.abort()
      running = null
      data.value = null
      error.value = null
      state.value = 'idle'
      return
    }
    const known = context.recall(wanted)
    if (known) {
      running?.abort()
      running = null
      adopt(known)
    } else if (!context.isServer) {
      void load(wanted)
    }
  }

  watch(path, follow, { immediate: true })

  onServerPrefetch(async () => {
    const wanted = path()
    if (wanted !== null && state.value === 'idle') await load(wanted)
  })
  onScopeDispose(() => running?.abort())

  return {
    state,
    data,
    error,
    async reload() {
      const wanted = path()
      if (wanted !== null) await load(wanted)
    },
  }
}
