import { createHead } from '@unhead/vue/server'
import { createPinia } from 'pinia'
import { createSSRApp } from 'vue'
import { createMemoryHistory } from 'vue-router'
import { renderToString } from 'vue/server-renderer'
import { describe, expect, test, vi } from 'vitest'
import type { SpeciesPage } from '../../../../shared/species.js'
import SpeciesPageContent from '../../../../src/components/species/SpeciesPageContent.vue'
import { pageContextKey, type StoredRead } from '../../../../src/composables/page-context.js'
import { createAppRouter } from '../../../../src/router/index.js'
import { usePreferencesStore } from '../../../../src/stores/preferences.js'
import { makeSpeciesPage } from '../../../helpers/species-page.js'

/** The page as the server writes it, and what it leaves in the page's state. */
async function render(page: SpeciesPage, address = `/species/${page.species.slug}`, isFahrenheit = false) {
  const warn = vi.spyOn(console, 'warn')
  const reads: StoredRead[] = []
  const app = createSSRApp(SpeciesPageContent, { page })
  const router = createAppRouter(createMemoryHistory())
  const pinia = createPinia()
  app.use(pinia).use(router).use(createHead())
  app.provide(pageContextKey, {
    origin: 'https://example.org',
    isServer: true,
    read: () => Promise.reject(new Error('The page reads nothing more.')),
    recall: (path) => reads.find((read) => read.path === path) ?? null,
    store: (read) => void reads.push(read),
    response: { status: 200, location: null },
  })
  usePreferencesStore(pinia).adopt({
    temperatureUnit: isFahrenheit ? 'degF' : 'degC',
    lengthUnit: 'cm',
    theme: 'light',
  })
  await router.push(address)
  const html = await renderToString(app)
  expect(warn).not.toHaveBeenCalled()
  warn.mockRestore()
  const body = new DOMParser().parseFromString(html, 'text/html').body
  return { body, text: (body.textContent ?? '').replaceAll(/\s+/g, ' '), reads }
}

describe('a species page', () => {
  test('carries the number, the printed words and the source behind each range', async () => {
    const { body } = await render(makeSpeciesPage())
    const [basking] = body.querySelectorAll('.ranges details')
    expect(basking?.querySelector('summary')?.textContent).toMatch(/40\s–\s46\s°C/)
    const rows = [...(basking?.querySelectorAll('tbody tr') ?? [])].map((row) => row.textContent ?? '')
    expect(rows).toHaveLength(4)
    expect(rows[1]).toMatch(/Brack & Sedge 2019 \[2\].*Measured at field sites, table 2.*41\s–\s47\s°C.*23/s)
    expect(rows[3]).toMatch(/of the body, supports no range/)
    for (const link of body.querySelectorAll('.ranges tbody a')) {
      expect(body.querySelector(link.getAttribute('href') ?? '')).not.toBeNull()
    }
  })

  test('leads every place of the drawing to a row that is there', async () => {
    const { body } = await render(makeSpeciesPage())
    const links = [...body.querySelectorAll('figure a')].map((link) => link.getAttribute('href') ?? '')
    expect(links.length).toBeGreaterThan(12)
    for (const link of links) expect(body.querySelector(link)?.tagName).toBe('DETAILS')
  })

  test('a range without evidence says that nobody cited it', async () => {
    const { text } = await render(makeSpeciesPage(), '/species/fabulacerta-cinnabarina?season=brumation')
    expect(text).toContain('Nobody has cited a source for this range yet.')
  })

  test('says at once that the body’s temperatures are no settings', async () => {
    const { text } = await render(makeSpeciesPage())
    expect(text).toContain('The animal’s body, never an enclosure setting.')
    expect(text).toContain('A critical limit is an acute figure')
  })

  test('without ranges gives no target and no switches, and leads with what is known of the body', async () => {
    const { body, text } = await render(makeSpeciesPage({ ranges: [] }))
    expect(text).toContain('No cited range yet')
    expect(body.querySelector('figure')).toBeNull()
    expect(body.querySelector('nav[aria-label="Life stage"]')).toBeNull()
    expect([...body.querySelectorAll('h2')].map((heading) => heading.textContent)).toEqual([
      'No cited range yet',
      'What is known of its body',
      'Living on warm stone',
      'Sources',
      'How this page came to be',
      'Your readings',
    ])
  })

  test('is written in the reader’s unit, printed numbers untouched', async () => {
    const { text } = await render(makeSpeciesPage(), undefined, true)
    expect(text).toMatch(/104 – 115 °F/)
    expect(text).toMatch(/38 – 44 °C/)
  })

  test('keeps the stage, the season and the lights on the way to the check', async () => {
    const { body } = await render(
      makeSpeciesPage(),
      '/species/fabulacerta-cinnabarina?stage=juvenile&lights=off',
    )
    const links = [...body.querySelectorAll('a.button')].map((link) => link.getAttribute('href'))
    expect(new Set(links)).toEqual(
      new Set(['/species/fabulacerta-cinnabarina/check?stage=juvenile&lights=off']),
    )
  })

  test('a pinned revision names the current one and leads to it', async () => {
    const page = makeSpeciesPage({ currentRevisionNumber: 5 })
    const { body } = await render(page, '/species/fabulacerta-cinnabarina/revisions/2')
    const note = body.querySelector('[role=note]')
    expect(note?.textContent).toMatch(/Revision 2 of 5/)
    expect(note?.querySelector('a')?.getAttribute('href')).toBe('/species/fabulacerta-cinnabarina')
  })

  test('an unresolved name and a name from memory are said plainly', async () => {
    const page = makeSpeciesPage()
    const names = page.names.map((name) =>
      name.row.kind === 'scientific'
        ? { ...name, row: { ...name.row, status: 'unresolved' as const } }
        : name,
    )
    const { text } = await render({ ...page, names })
    expect(text).toContain('Unresolved name.')
    expect(text).toContain('from memory, not looked up')
  })

  test('leaves the prose in the page’s state, so that no browser has to read Markdown', async () => {
    const { body, reads } = await render(makeSpeciesPage())
    expect(reads.map(({ path }) => path.split('/')[0])).toContain('prose')
    expect(body.querySelector('.prose a')?.getAttribute('href')).toBe('#source-2')
  })
})
