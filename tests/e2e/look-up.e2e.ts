import type { Page } from '@playwright/test'
import { BASKER } from './helpers/species.js'
import { expect, test } from './helpers/test.js'
import { revisit, visit } from './helpers/visit.js'

/** The sentence above the results that says how many there are. */
const countOf = (page: Page) => page.locator('#count')

test.describe('Looking a species up', () => {
  test('a misspelt name leads from the first page to the species', async ({ page }) => {
    await visit(page, '/')
    const box = page.getByRole('combobox', { name: 'Find a species' })
    await box.fill('pogona viticeps')
    const option = page.getByRole('option', { name: /Pogona vitticeps/ })
    await expect(option).toBeVisible()
    await option.click()
    await expect(page).toHaveURL('/species/pogona-vitticeps')
    await expect(page.getByRole('heading', { level: 1 })).toContainText('Pogona vitticeps')
  })

  test('an old combination finds the species under the name it has now, and says what was found', async ({
    page,
  }) => {
    await visit(page, '/')
    await page.getByRole('combobox', { name: 'Find a species' }).fill('Bufo marinus')
    await page.getByRole('button', { name: 'Find' }).click()
    await expect(page).toHaveURL('/species?q=Bufo+marinus')
    const row = page.getByRole('region', { name: 'Results' }).getByRole('listitem').first()
    await expect(row).toContainText('Rhinella marina')
    await expect(row).toContainText('found as “Bufo marinus”')
    await row.getByRole('link', { name: 'Rhinella marina' }).click()
    await expect(page).toHaveURL('/species/rhinella-marina')
    await expect(page.getByRole('heading', { level: 1 })).toContainText('Rhinella marina')
  })

  test('a common name finds its species as it is typed into the list', async ({ page }) => {
    await visit(page, '/species')
    await page.getByLabel('Find a species').fill('brack basker')
    const rows = page.getByRole('region', { name: 'Results' }).getByRole('listitem')
    await expect(rows.first()).toContainText(BASKER.name)
    await expect(page).toHaveURL('/species?q=brack+basker')
    await rows.first().getByRole('link', { name: BASKER.name }).click()
    await expect(page.getByRole('note', { name: 'Invented' })).toBeVisible()
  })
})

test.describe('The list of species', () => {
  test('begins with the pages that have cited ranges and marks the invented ones', async ({ page }) => {
    await visit(page, '/species')
    const rows = page
      .getByRole('region', { name: 'Results' })
      .getByRole('listitem')
      .filter({ has: page.getByRole('link') })
    await expect(rows.first()).toContainText('cited range')
    const invented = rows.filter({ hasText: BASKER.name })
    await expect(invented).toContainText('invented')
  })

  test('keeps a choice of facets in the address, through reload and back', async ({ page }) => {
    await visit(page, '/species')
    const filters = page.getByRole('region', { name: 'Filters' })
    const count = countOf(page)
    await expect(count).toHaveText(/^\d+ species$/)
    const all = await count.textContent()
    const box = filters.getByRole('group', { name: 'Class' }).getByRole('checkbox', { name: /Amphibia/ })
    await box.check()
    await expect(page).toHaveURL('/species?class=Amphibia')
    await expect(count).not.toHaveText(all ?? '')
    const amphibians = await count.textContent()
    await revisit(page)
    await expect(box).toBeChecked()
    await expect(count).toHaveText(amphibians ?? '')
    await page.goBack()
    await expect(page).toHaveURL('/species')
    await expect(count).toHaveText(all ?? '')
    await expect(box).not.toBeChecked()
  })

  test('counts in each facet what choosing it would show', async ({ page }) => {
    await visit(page, '/species')
    const row = page
      .getByRole('region', { name: 'Filters' })
      .getByRole('group', { name: 'Class' })
      .locator('label')
      .filter({ hasText: 'Amphibia' })
    const promised = /\d+$/.exec((await row.innerText()).trim())?.[0] ?? ''
    await row.getByRole('checkbox').check()
    const count = countOf(page)
    await expect(count).toHaveText(`${promised} species`)
  })

  test('finds pages by a range that meets the one asked for, typed in the reader’s own unit', async ({
    page,
  }) => {
    await visit(page, '/species')
    await page.getByRole('radio', { name: '°F' }).check({ force: true })
    const filters = page.getByRole('region', { name: 'Filters' })
    // 111 to 115 °F is 43.9 to 46.1 °C; the basker's slab is to read 44 to 50 °C.
    await filters.getByLabel('from').fill('111')
    await filters.getByLabel('to', { exact: true }).fill('115')
    await filters.getByRole('button', { name: 'Add this filter' }).click()
    await expect(page).toHaveURL(/overlap=temperature\.basking-surface\.day\.43\.8+9_46\.1+/)
    const rows = page.getByRole('region', { name: 'Results' }).locator('ol').getByRole('listitem')
    await expect(rows.filter({ hasText: BASKER.name })).toBeVisible()
    await expect(rows.filter({ hasText: 'Pogona vitticeps' })).toHaveCount(0)
    const chip = page.getByRole('list', { name: 'Filters that are on' }).getByRole('link').first()
    await expect(chip).toContainText('111')
    await revisit(page)
    await expect(chip).toContainText('°F')
    await chip.click()
    await expect(page).toHaveURL('/species')
  })

  test('goes on behind the first rows, and an address leads to the later ones', async ({ page }) => {
    await visit(page, '/species')
    const rows = page.getByRole('region', { name: 'Results' }).locator('ol').getByRole('link')
    await expect(rows).toHaveCount(20)
    const more = page.getByRole('link', { name: 'Show more' })
    const address = (await more.getAttribute('href')) ?? ''
    await more.click()
    await expect(page.getByText(/^That is all: \d+ species\.$/)).toBeVisible()
    const names = await rows.allTextContents()
    expect(new Set(names).size).toBe(names.length)
    const total = await countOf(page).textContent()
    expect(total).toBe(`${names.length} species`)
    await visit(page, address)
    await expect(page.getByText('These are later rows.')).toBeVisible()
    await expect(rows.first()).toHaveText(names[20] ?? '')
  })

  test('offers to ask for a page that nobody has begun, and counts the wish', async ({ page }) => {
    const name = 'Zzyzxia nemorosa'
    await visit(page, `/species?q=${encodeURIComponent(name)}`)
    await expect(page.getByText(`No page for “${name}”.`)).toBeVisible()
    await page.getByRole('button', { name: `Ask for a page on “${name}”` }).click()
    await expect(page.getByText(/Counted: /)).toContainText('yours is the first wish')
    await revisit(page)
    await page.getByRole('button', { name: `Ask for a page on “${name}”` }).click()
    await expect(page.getByText(/Counted: /)).toContainText('2 wishes so far')
  })

  test('says what is wrong with an address it cannot read', async ({ page, watch }) => {
    watch.expect(/status of 400/)
    const response = await visit(page, '/species?overlap=warm&sort=sideways')
    expect(response?.status()).toBe(400)
    await expect(page.getByRole('alert')).toContainText('This address cannot be read as a search.')
    await page.getByRole('link', { name: 'Show all species' }).click()
    await expect(countOf(page)).toHaveText(/^\d+ species$/)
  })
})
