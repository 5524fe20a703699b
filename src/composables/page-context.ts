import { inject, type InjectionKey } from 'vue'
import type { Preferences } from '../api/preferences.js'

/** An answer or a refusal that the server read while it rendered the page. */
export type StoredRead =
  | { path: string; answer: unknown }
  | { path: string; error: { status: number; code: string; message: string } }

/** What a rendered page carries for the browser, as JSON in `#page-state`. */
export interface PageState {
  origin: string
  preferences: Preferences
  reads: StoredRead[]
}

/** What one page, on the server or in the browser, reads with and answers with. */
export interface PageContext {
  /** Scheme and host of the site, for canonical addresses. */
  origin: string
  isServer: boolean
  /** Gives the answer of a read below /api/v1, or throws. */
  read(path: string, signal?: AbortSignal): Promise<unknown>
  /** An answer already at hand: the page's own on the first look, a fresh one on the way back. */
  recall(path: string): StoredRead | null
  /** Keeps an answer: on the server for the page's state, in the browser for the way back. */
  store(read: StoredRead): void
  /** The HTTP status and place to go to; only the server looks at them. */
  response: { status: number; location: string | null }
}

export const pageContextKey: InjectionKey<PageContext> = Symbol('page context')

/** Gives the page's context; throws where the app was made without one. */
export function usePageContext(): PageContext {
  const context = inject(pageContextKey)
  if (!context) throw new Error('The app was created without a page context.')
  return context
}
