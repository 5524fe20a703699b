import { onScopeDispose, ref, shallowRef, type Ref, type ShallowRef } from 'vue'
import { toApiError } from '../api/api-error.js'
import { suggestionsPath, type Suggestions } from '../api/search.js'
import { usePageContext } from './page-context.js'
import { useDebounced } from './useDebounced.js'

const LETTERS_MIN = 2
const WAIT_MS = 160

export interface SuggestionList {
  /** The words the suggestions are for; empty while there are none. */
  words: Ref<string>
  suggestions: ShallowRef<Suggestions | null>
  hasFailed: Ref<boolean>
  suggest: (words: string) => void
  clear: () => void
}

/** Names that fit what is being typed. An answer to words typed over meanwhile is dropped. */
export function useSuggestions(): SuggestionList {
  const context = usePageContext()
  const words = ref('')
  const suggestions = shallowRef<Suggestions | null>(null)
  const hasFailed = ref(false)
  let running: AbortController | null = null

  async function load(wanted: string): Promise<void> {
    running?.abort()
    const mine = new AbortController()
    running = mine
    const path = suggestionsPath(wanted)
    try {
      const known = context.recall(path)
      const answer = known && 'answer' in known ? known.answer : await context.read(path, mine.signal)
      if (running !== mine || mine.signal.aborted) return
      context.store({ path, answer })
      words.value = wanted
      suggestions.value = answer as Suggestions
      hasFailed.value = false
    } catch (thrown) {
      if (running !== mine || mine.signal.aborted) return
      hasFailed.value = toApiError(thrown).status !== 400
      suggestions.value = null
    }
  }

  const debounced = useDebounced((wanted: string) => void load(wanted), WAIT_MS)

  function clear(): void {
    debounced.cancel()
    running?.abort()
    running = null
    words.value = ''
    suggestions.value = null
    hasFailed.value = false
  }

  onScopeDispose(clear)
  return {
    words,
    suggestions,
    hasFailed,
    suggest(typed) {
      const wanted = typed.trim()
      if (wanted.length < LETTERS_MIN) clear()
      else debounced.call(wanted)
    },
    clear,
  }
}
