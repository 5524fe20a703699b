import type { Page } from '@playwright/test'
import { BASKER, FENCE_LIZARD } from './helpers/species.js'
import { expect, test } from './helpers/test.js'
import { revisit, visit } from './helpers/visit.js'

/** The row of a place on the species page. */
const rowOf = (page: Page, place: string) =>
  page.getByRole('region', { name: 'Ranges' }).locator('details').filter({ hasText: place }).first()

test.describe('Reading the page of an invented species', () => {
  test('says on every screen of it that it is invented', async ({ page }) => {
    for (const path of ['', '/revisions', '/revisions/1', '/check']) {
      await visit(page, `/species/${BASKER.slug}${path}`)
      await expect(page.getByRole('note', { name: 'Invented' })).toBeVisible()
    }
    await expect(page.locator('meta[name=robots]')).toHaveAttribute('content', /noindex/)
  })

  test('a row opens to who says so, with numbers as printed and the unit they were printed in', async ({
    page,
  }) => {
    await visit(page, `/species/${BASKER.slug}`)
    const row = rowOf(page, 'Basking surface')
    await expect(row).toContainText(/44\s–\s50/)
    await row.locator('summary').first().click()
    const table = row.getByRole('table')
    await expect(table.getByRole('row').filter({ hasText: 'figure 2' })).toContainText('47.2')
    const report = table.getByRole('row').filter({ hasText: 'The slab' })
    await expect(report).toContainText('108')
    await expect(report).toContainText('°F')
    await expect(report).toContainText('42.2')
    await report.getByRole('link').click()
    await expect(page).toHaveURL(/#source-\d+$/)
  })

  test('the switches are the address: another stage and the lights off give other targets, kept by reload', async ({
    page,
  }) => {
    await visit(page, `/species/${BASKER.slug}`)
    const slab = rowOf(page, 'Basking surface')
    await expect(slab).toContainText(/44\s–\s50/)
    await page.getByRole('navigation', { name: 'Life stage' }).getByRole('link', { name: 'Juvenile' }).click()
    await expect(page).toHaveURL(`/species/${BASKER.slug}?stage=juvenile`)
    await expect(slab).toContainText(/40\s–\s46/)
    await page.getByRole('navigation', { name: 'Lights' }).getByRole('link', { name: 'Off' }).click()
    await expect(page).toHaveURL(`/species/${BASKER.slug}?stage=juvenile&lights=off`)
    await expect(rowOf(page, 'Warm-end air')).toContainText(/19\s–\s24/)
    await revisit(page)
    await expect(rowOf(page, 'Warm-end air')).toContainText(/19\s–\s24/)
    await expect(
      page.getByRole('navigation', { name: 'Lights' }).getByRole('link', { name: 'Off' }),
    ).toHaveAttribute('aria-current', 'true')
  })

  test('the unit chosen holds on every page and in the server’s own markup', async ({ page }) => {
    await visit(page, `/species/${BASKER.slug}`)
    const slab = rowOf(page, 'Basking surface')
    await expect(slab).toContainText('°C')
    await page.getByRole('radio', { name: '°F' }).check({ force: true })
    // 44 to 50 °C.
    await expect(slab).toContainText(/111\s–\s122/)
    await revisit(page)
    await expect(slab).toContainText(/111\s–\s122/)
    const markup = await (await page.request.get(`/species/${BASKER.slug}`)).text()
    expect(markup).toMatch(/111\s–\s122/)
    expect(markup).not.toMatch(/44\s–\s50/)
  })

  test('the theme chosen is kept and comes with the first byte', async ({ page }) => {
    await visit(page, `/species/${BASKER.slug}`)
    const background = () => page.evaluate(() => getComputedStyle(document.body).backgroundColor)
    await page.locator('summary').filter({ hasText: 'Menu and display' }).click()
    await page.getByRole('radio', { name: 'Light' }).check({ force: true })
    const light = await background()
    await page.getByRole('radio', { name: 'Dark' }).check({ force: true })
    await expect.poll(background).not.toBe(light)
    const dark = await background()
    await revisit(page)
    expect(await background()).toBe(dark)
    const markup = await (await page.request.get(`/species/${BASKER.slug}`)).text()
    expect(markup).toMatch(/<html[^>]*data-theme="dark"/)
  })

  test('an earlier revision stands as it was published and leads to the current one', async ({ page }) => {
    await visit(page, `/species/${BASKER.slug}`)
    const history = page.getByRole('region', { name: 'How this page came to be' })
    await history.getByRole('link', { name: 'Revision 1', exact: true }).click()
    await expect(page).toHaveURL(`/species/${BASKER.slug}/revisions/1`)
    await expect(rowOf(page, 'Basking surface')).toContainText(/40\s–\s46/)
    await expect(page.getByRole('note').filter({ hasText: 'kept as it was published' })).toContainText(
      'Revision 1 of 4',
    )
    await expect(page.locator('meta[name=robots]')).toHaveAttribute('content', /noindex/)
    await page.getByRole('link', { name: 'Current: revision 4' }).click()
    await expect(page).toHaveURL(`/species/${BASKER.slug}`)
    await expect(rowOf(page, 'Basking surface')).toContainText(/44\s–\s50/)
  })
})

test.describe('Reading the page of a real species', () => {
  test('without a cited range it gives no target and asks for a source', async ({ page }) => {
    await visit(page, `/species/${FENCE_LIZARD.slug}`)
    await expect(page.getByRole('note', { name: 'Invented' })).toHaveCount(0)
    await expect(page.getByRole('heading', { name: 'No cited range yet' })).toBeVisible()
    await expect(page.getByText('The animal’s body, never an enclosure setting.')).toBeVisible()
  })

  test('the records behind a line open with the words and numbers of their dataset', async ({ page }) => {
    await visit(page, `/species/${FENCE_LIZARD.slug}`)
    const body = page.getByRole('region', { name: 'What is known of its body' })
    await expect(body).toContainText('Records from')
    const entry = body.locator('details').first()
    await entry.locator('summary').first().click()
    const records = entry.locator('details.records').first()
    await records.locator('summary').click()
    await expect(records.getByRole('listitem').first()).toContainText('°C')
    await expect(records.getByRole('listitem').first()).toContainText('as Sceloporus')
  })

  test('every source of the page has its own page, which names the species it is cited on', async ({
    page,
  }) => {
    await visit(page, `/species/${FENCE_LIZARD.slug}`)
    await page
      .getByRole('region', { name: 'Sources' })
      .getByRole('link', { name: /all that cites it/ })
      .first()
      .click()
    await expect(page).toHaveURL(/\/sources\/[0-9a-f-]{36}$/)
    await expect(page.getByRole('main')).toContainText(FENCE_LIZARD.name)
  })

  test('an address that names no species says so with its status', async ({ page, watch }) => {
    watch.expect(/status of 404/)
    const response = await visit(page, '/species/no-such-animal')
    expect(response?.status()).toBe(404)
    await expect(page.getByRole('heading', { level: 1 })).toHaveText('No such page')
  })
})
