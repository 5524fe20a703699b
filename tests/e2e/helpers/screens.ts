import type { Page } from '@playwright/test'
import { BASKER, FENCE_LIZARD } from './species.js'

/** A screen as it is looked at: an address, and what is opened on it. */
export interface Screen {
  title: string
  path: string
  /** The status it answers with; 200 unless said. */
  status?: number
  /** Opens what is to be looked at too. */
  open?: (page: Page) => Promise<void>
}

/** Opens everything on the page that folds. */
async function unfold(page: Page): Promise<void> {
  await page.getByRole('main').evaluate((main) => {
    for (const details of main.querySelectorAll('details')) details.open = true
  })
}

/** Every screen of the product. */
export const SCREENS: readonly Screen[] = [
  { title: 'the first page', path: '/' },
  {
    title: 'the suggestions of the search',
    path: '/',
    async open(page) {
      await page.getByRole('combobox', { name: 'Find a species' }).fill('rana')
      await page.getByRole('option').first().waitFor()
    },
  },
  {
    title: 'the menu',
    path: '/about',
    async open(page) {
      await page.locator('summary').filter({ hasText: 'Menu and display' }).click()
    },
  },
  { title: 'the list of species', path: '/species' },
  {
    title: 'the filters of the list',
    path: '/species?class=Reptilia&overlap=temperature.basking-surface.day.35_50',
    async open(page) {
      const opener = page.getByRole('button', { name: /^Filters/ })
      if (await opener.isVisible()) await opener.click()
      await unfold(page)
    },
  },
  { title: 'a search without a hit', path: '/species?q=zzyzxus+zzyzx' },
  { title: 'a search that cannot be read', path: '/species?sort=sideways', status: 400 },
  { title: 'the page of an invented species', path: `/species/${BASKER.slug}` },
  { title: 'the page of an invented species, unfolded', path: `/species/${BASKER.slug}`, open: unfold },
  {
    title: 'the page of a species with the lights off',
    path: `/species/${BASKER.slug}?lights=off&stage=juvenile`,
  },
  { title: 'the page of a real species, unfolded', path: `/species/${FENCE_LIZARD.slug}`, open: unfold },
  { title: 'the page of a real species with ranges', path: '/species/trachemys-scripta', open: unfold },
  { title: 'the page of a species with many records', path: '/species/rhinella-marina' },
  { title: 'an earlier revision', path: `/species/${BASKER.slug}/revisions/1` },
  { title: 'the revisions of a page', path: `/species/${BASKER.slug}/revisions` },
  { title: 'a species that there is not', path: '/species/no-such-animal', status: 404 },
  { title: 'the way to a check', path: '/check' },
  { title: 'an empty check', path: `/species/${BASKER.slug}/check` },
  { title: 'the sources', path: '/sources' },
  {
    title: 'a source',
    path: '/sources',
    async open(page) {
      await page.getByRole('main').getByRole('listitem').getByRole('link').first().click()
      await page.waitForURL(/\/sources\/[0-9a-f-]{36}$/)
      await page.getByRole('main').getByRole('heading', { level: 1 }).waitFor()
    },
  },
  { title: 'about', path: '/about' },
  { title: 'the method', path: '/method' },
  { title: 'the attributions', path: '/attributions' },
  { title: 'the terms', path: '/terms' },
  { title: 'privacy', path: '/privacy' },
  { title: 'an address without a page', path: '/no-such-page', status: 404 },
]
