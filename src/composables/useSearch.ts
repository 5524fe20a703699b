import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import type { SearchAnswer, SearchQuery } from '../../shared/search.js'
import {
  EMPTY_SEARCH,
  parseSearchQuery,
  writeSearchString,
  type SearchQueryError,
} from '../../shared/search-query.js'
import type { SpeciesListItem } from '../../shared/species.js'
import { searchPath } from '../api/paths.js'
import { useDebounced } from './useDebounced.js'
import { usePagedRead, type PagedRead } from './usePagedRead.js'

const TYPING_WAIT_MS = 200

export interface SpeciesSearch {
  /** What the address bar asks for; `EMPTY_SEARCH` where it cannot be read. */
  query: ComputedRef<SearchQuery>
  /** What is wrong with the address, if anything. */
  addressErrors: ComputedRef<SearchQueryError[]>
  /** The words as they are being typed. */
  words: Ref<string>
  results: PagedRead<SearchAnswer, SpeciesListItem>
  /** Address of this search with some of it changed, from its first page on. */
  addressWith: (change: Partial<SearchQuery>) => string
  /** Goes to that address, as a step that Back undoes. */
  change: (change: Partial<SearchQuery>) => Promise<void>
  /** Searches for the typed words at once. */
  submit: () => Promise<void>
}

/** The search whose whole state is the address bar. */
export function useSearch(): SpeciesSearch {
  const route = useRoute()
  const router = useRouter()
  const parsed = computed(() => parseSearchQuery(route.query))
  const query = computed(() => (parsed.value.ok ? parsed.value.query : EMPTY_SEARCH))
  const addressErrors = computed(() => (parsed.value.ok ? [] : parsed.value.errors))
  const words = ref(query.value.q)

  const results = usePagedRead<SearchAnswer, SpeciesListItem>({
    path(cursor) {
      return parsed.value.ok ? searchPath(writeSearchString({ ...query.value, cursor })) : null
    },
    startCursor: () => query.value.cursor,
    toItems: (answer) => answer.items,
    toNextCursor: (answer) => answer.nextCursor,
    keepsLast: true,
  })

  function addressWith(change: Partial<SearchQuery>): string {
    return `/species${writeSearchString({ ...query.value, cursor: null, ...change })}`
  }

  const typing = useDebounced((typed: string) => {
    if (route.name === 'species-list' && typed.trim() !== query.value.q) {
      // Each letter is no step of its own for Back.
      void router.replace(addressWith({ q: typed }))
    }
  }, TYPING_WAIT_MS)

  watch(words, (typed) => typing.call(typed))
  watch(
    () => query.value.q,
    (q) => {
      if (words.value.trim().replace(/\s+/g, ' ') !== q) words.value = q
    },
  )

  return {
    query,
    addressErrors,
    words,
    results,
    addressWith,
    async change(change) {
      typing.cancel()
      await router.push(addressWith({ q: words.value, ...change }))
    },
    async submit() {
      typing.cancel()
      await router.replace(addressWith({ q: words.value }))
    },
  }
}
