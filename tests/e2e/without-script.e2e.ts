import { JOURNEY_CHECK, toCheckAddress } from './helpers/check-links.js'
import { BASKER, FENCE_LIZARD } from './helpers/species.js'
import { expect, test } from './helpers/test.js'

test.use({ javaScriptEnabled: false })

test.describe('Without JavaScript', () => {
  test('the list is searched and filtered by its form', async ({ page }) => {
    await page.goto('/species')
    await page.getByLabel('Find a species').fill('pogona viticeps')
    await page.getByRole('button', { name: 'Find', exact: true }).click()
    await expect(page).toHaveURL(/\/species\?.*q=pogona\+viticeps/)
    await page.getByRole('link', { name: 'Pogona vitticeps' }).click()
    await expect(page.getByRole('heading', { level: 1 })).toContainText('Pogona vitticeps')
  })

  test('a facet and a range filter are chosen, and further rows are a link', async ({ page }) => {
    await page.goto('/species')
    await page.getByRole('link', { name: 'Show more' }).click()
    await expect(page.getByText('These are later rows.')).toBeVisible()
    await page.goto('/species')
    await page
      .getByRole('group', { name: 'Class' })
      .getByRole('checkbox', { name: /Reptilia/ })
      .check()
    await page.getByLabel('from').fill('44')
    await page.getByRole('button', { name: 'Show results' }).click()
    await expect(page).toHaveURL(/class=Reptilia/)
    await expect(page).toHaveURL(/overlap=temperature\.basking-surface\.day\.44_/)
    await expect(page.getByRole('link', { name: BASKER.name })).toBeVisible()
  })

  test('a species page reads whole: switches, ranges, evidence, body, sources', async ({ page }) => {
    await page.goto(`/species/${BASKER.slug}`)
    await page.getByRole('navigation', { name: 'Life stage' }).getByRole('link', { name: 'Juvenile' }).click()
    const slab = page
      .getByRole('region', { name: 'Ranges' })
      .locator('details')
      .filter({ hasText: 'Basking surface' })
      .first()
    await expect(slab).toContainText(/40\s–\s46/)
    await slab.locator('summary').first().click()
    await expect(slab.getByRole('table')).toContainText('table 3, row 2')
    await page.goto(`/species/${FENCE_LIZARD.slug}`)
    await expect(page.getByRole('region', { name: 'What is known of its body' })).toBeVisible()
    await expect(page.getByRole('region', { name: 'Sources' }).getByRole('listitem').first()).toBeVisible()
  })

  test('the unit is chosen by a form and kept', async ({ page }) => {
    await page.goto(`/species/${BASKER.slug}`)
    await page.getByRole('radio', { name: '°F' }).check({ force: true })
    await page.getByRole('button', { name: 'Set' }).first().click()
    await expect(page).toHaveURL(`/species/${BASKER.slug}`)
    await expect(page.getByRole('region', { name: 'Ranges' })).toContainText(/111\s–\s122/)
  })

  test('a shared check shows its verdicts, and says what it cannot do', async ({ page }) => {
    await page.goto(toCheckAddress(JOURNEY_CHECK))
    for (const word of ['High', 'Can’t tell', 'No cited range', 'Near a limit', 'Past a limit']) {
      await expect(page.locator('.reading .answer').filter({ hasText: word })).toHaveCount(1)
    }
    await expect(page.getByText('Typing readings needs JavaScript.')).toBeVisible()
    await expect(page.getByRole('region', { name: 'What to change first' })).toBeVisible()
  })

  test('an older link says so and names what differs', async ({ page }) => {
    await page.goto(toCheckAddress({ ...JOURNEY_CHECK, revision: 1 }))
    const note = page.getByRole('region', { name: /no longer current/ })
    await expect(note).toContainText('Revision 4 would answer otherwise for 1 reading')
  })

  test('every other page has its heading and its words', async ({ page }) => {
    for (const path of [
      '/',
      '/sources',
      '/about',
      '/method',
      '/attributions',
      '/terms',
      '/privacy',
      '/check',
    ]) {
      await page.goto(path)
      await expect(page.getByRole('heading', { level: 1 })).toBeVisible()
      expect((await page.getByRole('main').innerText()).length).toBeGreaterThan(200)
    }
  })
})
