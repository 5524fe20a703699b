import { setup as collectNaiveStyles } from '@css-render/vue3-ssr'
import { createHead, renderSSRHead } from '@unhead/vue/server'
import { renderToString } from 'vue/server-renderer'
import { createMemoryHistory } from 'vue-router'
import fontRegularUrl from '@fontsource/fira-sans/files/fira-sans-latin-400-normal.woff2?url'
import fontMediumUrl from '@fontsource/fira-sans/files/fira-sans-latin-500-normal.woff2?url'
import { createApp } from './app.js'
import { toTokensCss } from './assets/tokens-css.js'
import type { PageContext, PageState, StoredRead } from './composables/page-context.js'
import type { Preferences } from './api/preferences.js'

export interface RenderInput {
  /** Answers a read by its path below /api/v1 (`/species/x?revision=2`); throws an error with `status`, `code`, `message`. */
  read(path: string): Promise<unknown>
  preferences: Preferences
  /** Scheme and host of the site, no slash at the end. */
  origin: string
}

export interface RenderedPage {
  status: number
  /** Where the reader is sent instead (with a 3xx status), else null. */
  location: string | null
  /** Markup of the page, for inside `#app`. */
  html: string
  /** Title, meta, links and JSON-LD. */
  headTags: string
  htmlAttrs: string
  bodyAttrs: string
  /** JSON for `<script type="application/json" id="page-state">`, escaped so that it cannot end the element. */
  state: string
  /** `<style>` elements for the head: our tokens, then those of the component library. */
  css: string
  /** Whether the page is whole: it then depends on nothing but its address, units, theme and the published data. */
  cacheable: boolean
  /** Modules the page used, for preload links by the build's manifest. */
  modules: string[]
}

const tokensStyle = `<style>${toTokensCss()}</style>`

/** JSON that is safe inside a script element: no `<`, and no line ends that JavaScript reads but JSON does not. */
function toSafeJson(value: unknown): string {
  return JSON.stringify(value)
    .replaceAll('<', '\\u003c')
    .replaceAll('\u2028', '\\u2028')
    .replaceAll('\u2029', '\\u2029')
}

/** Renders the page at `url` (path and query). A read that fails becomes a page that says so, with its status. */
export async function render(url: string, input: RenderInput): Promise<RenderedPage> {
  const reads: StoredRead[] = []
  const context: PageContext = {
    origin: input.origin,
    isServer: true,
    read: (path) => input.read(path),
    recall: (path) => reads.find((read) => read.path === path) ?? null,
    store: (read) => void reads.push(read),
    response: { status: 200, location: null },
  }
  const head = createHead()
  const { app, router } = createApp({
    history: createMemoryHistory(),
    head,
    context,
    preferences: input.preferences,
  })
  const { collect } = collectNaiveStyles(app)
  head.push({
    link: [fontRegularUrl, fontMediumUrl].map((href) => ({
      rel: 'preload',
      as: 'font',
      type: 'font/woff2',
      href,
      crossorigin: 'anonymous',
    })),
  })
  await router.push(url)
  await router.isReady()
  const ssrContext: { modules?: Set<string> } = {}
  const html = await renderToString(app, ssrContext)
  const { headTags, htmlAttrs, bodyAttrs } = renderSSRHead(head)
  const state: PageState = { origin: input.origin, preferences: input.preferences, reads }
  const { status, location } = context.response
  return {
    status,
    location,
    html,
    headTags,
    htmlAttrs,
    bodyAttrs,
    state: toSafeJson(state),
    css: tokensStyle + collect(),
    cacheable: status === 200 && reads.every((read) => !('error' in read)),
    modules: [...(ssrContext.modules ?? [])],
  }
}
