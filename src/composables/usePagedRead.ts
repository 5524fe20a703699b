import { computed, onMounted, ref, shallowRef, watch, type ComputedRef, type Ref, type ShallowRef } from 'vue'
import { toApiError, type ApiError } from '../api/api-error.js'
import { usePageContext } from './page-context.js'
import { useRead, type ReadOptions, type ReadResult } from './useRead.js'

export interface PagedRead<A, I> {
  /** The first page, with everything that stands beside its rows. */
  first: ReadResult<A>
  /** The rows of all pages read so far. */
  items: ComputedRef<I[]>
  /** Cursor of the page that comes next, null at the end. */
  nextCursor: ComputedRef<string | null>
  isLoadingMore: Ref<boolean>
  moreError: ShallowRef<ApiError | null>
  loadMore: () => Promise<void>
}

interface PagedReadOptions<A, I> extends ReadOptions {
  /** Path of the page at a cursor (null: the first one), or null to read nothing. */
  path(cursor: string | null): string | null
  /** Cursor the address bar asks for. */
  startCursor?(): string | null
  toItems(answer: A): readonly I[]
  toNextCursor(answer: A): string | null
}

/** Key in the history's state under which a list keeps how many pages were open, for the way back. */
const HISTORY_KEY = 'openPages'

function openPagesBefore(): number {
  const state: unknown = window.history.state
  if (typeof state !== 'object' || state === null || !(HISTORY_KEY in state)) return 1
  const pages: unknown = state[HISTORY_KEY]
  return typeof pages === 'number' ? Math.min(pages, 50) : 1
}

/** A list in pages: more rows are added below, and are there again when the reader comes back to it. */
export function usePagedRead<A, I>(options: PagedReadOptions<A, I>): PagedRead<A, I> {
  const context = usePageContext()
  const firstPath = (): string | null => options.path(options.startCursor?.() ?? null)
  const first = useRead<A>(firstPath, options)
  const more = shallowRef<A[]>([])
  const isLoadingMore = ref(false)
  const moreError = shallowRef<ApiError | null>(null)
  /** Counts the questions, so that a page of an earlier one is dropped. */
  let question = 0

  const answers = computed(() => (first.data.value === null ? [] : [first.data.value, ...more.value]))
  const items = computed(() => answers.value.flatMap((answer) => [...options.toItems(answer)]))
  const nextCursor = computed(() => {
    const last = answers.value.at(-1)
    return last === undefined ? null : options.toNextCursor(last)
  })

  // Rows that were added belong to the answer they were added to.
  watch(first.data, () => {
    question += 1
    more.value = []
    moreError.value = null
    isLoadingMore.value = false
  })

  function add(answer: A): void {
    more.value = [...more.value, answer]
    window.history.replaceState({ ...window.history.state, [HISTORY_KEY]: more.value.length + 1 }, '')
  }

  async function loadMore(): Promise<void> {
    const cursor = nextCursor.value
    const path = cursor === null ? null : options.path(cursor)
    if (path === null || isLoadingMore.value) return
    const known = context.recall(path)
    if (known && 'answer' in known) {
      add(known.answer as A)
      return
    }
    const mine = question
    isLoadingMore.value = true
    moreError.value = null
    try {
      const answer = await context.read(path)
      if (mine !== question) return
      context.store({ path, answer })
      add(answer as A)
    } catch (thrown) {
      if (mine === question) moreError.value = toApiError(thrown)
    } finally {
      if (mine === question) isLoadingMore.value = false
    }
  }

  onMounted(async () => {
    const wanted = openPagesBefore()
    while (more.value.length + 1 < wanted && nextCursor.value !== null && moreError.value === null) {
      const before = more.value.length
      await loadMore()
      if (more.value.length === before) break
    }
  })

  return { first, items, nextCursor, isLoadingMore, moreError, loadMore }
}
