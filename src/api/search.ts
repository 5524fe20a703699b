import type { PageRequestAnswer } from '../../shared/page-requests.js'
import type { SearchAnswer } from '../../shared/search.js'
import { postJson } from './client.js'
import { searchPath } from './paths.js'

/** How many names a search field suggests. */
const SUGGESTIONS = 7

/** Address of the few best hits for words being typed. */
export function suggestionsPath(words: string): string {
  return searchPath(`?${new URLSearchParams({ q: words, limit: String(SUGGESTIONS) }).toString()}`)
}

export type Suggestions = Pick<SearchAnswer, 'items' | 'total' | 'nearest'>

/** Counts one wish for a page that does not exist yet, and gives how often it was wished for. */
export async function askForPage(name: string): Promise<PageRequestAnswer> {
  return (await postJson('/page-requests', { name })) as PageRequestAnswer
}
