import { CHECK_LINK_PARAMETER, decodeCheck } from '../../shared/checker/check-link.js'
import { checkResultSchema } from '../../shared/checker/check.js'
import { VERDICT_LABELS } from '../../shared/labels.js'
import { addPlace, fieldOf, readVerdicts, rowOf } from './helpers/check-form.js'
import { JOURNEY_CHECK, JOURNEY_READINGS, toCheckAddress } from './helpers/check-links.js'
import { BASKER } from './helpers/species.js'
import { expect, test } from './helpers/test.js'
import { revisit, visit } from './helpers/visit.js'

const CHECK = `/species/${BASKER.slug}/check`

test.describe('Checking readings', () => {
  test('a hot, an unclear, an uncited, a near and a past reading get the same verdicts typed, reloaded, by link and by the API', async ({
    page,
    browser,
    watch,
  }) => {
    await visit(page, '/check')
    await page.getByRole('main').getByRole('combobox', { name: 'Find a species' }).fill('salt-pan lizard')
    await page.getByRole('option', { name: new RegExp(BASKER.name) }).click()
    await expect(page).toHaveURL(CHECK)

    // The page asks 44 to 50 °C of the slab, with 58 °C as its upper limit; a comma is a decimal point too.
    await fieldOf(page, 'Basking surface, lights on').fill('53,5')
    await expect(rowOf(page, 'Basking surface, lights on')).toContainText('High')
    // 31 to 35 °C: on the bound.
    await fieldOf(page, 'Warm-end air, lights on').fill('35')
    await expect(rowOf(page, 'Warm-end air, lights on')).toContainText('Can’t tell')
    // 24 to 28 °C, upper limit 35 °C.
    await fieldOf(page, 'Cool-end air, lights on').fill('34.8')
    await expect(rowOf(page, 'Cool-end air, lights on')).toContainText('Near a limit')
    // 30 to 33 °C, upper limit 40 °C.
    await fieldOf(page, 'Warm hide, lights on').fill('43')
    await expect(rowOf(page, 'Warm hide, lights on')).toContainText('Past a limit')
    await addPlace(page, 'Water')
    await fieldOf(page, 'Water, lights on').fill('22')
    await expect(rowOf(page, 'Water, lights on')).toContainText('No cited range')
    await page.getByRole('textbox', { name: 'Temperature of the room' }).fill('22')

    const outcome = page.getByRole('complementary', { name: 'The outcome' })
    await expect(outcome).toContainText('5 readings, the worst: Past a limit')
    await expect(outcome.getByRole('region', { name: 'What to change first' })).toContainText('Warm hide')
    const typed = await readVerdicts(page)
    expect(typed).toHaveLength(5)

    await expect(page).toHaveURL(/\?c=1_4_aa_c22\*.*tl/)
    const address = page.url()
    await revisit(page)
    await expect(outcome).toContainText('5 readings')
    expect(await readVerdicts(page)).toEqual(typed)

    const other = await (await watch.open(browser)).newPage()
    await visit(other, address)
    await expect(other.getByRole('complementary', { name: 'The outcome' })).toContainText('5 readings')
    expect(await readVerdicts(other)).toEqual(typed)

    const link = new URL(address).searchParams.get(CHECK_LINK_PARAMETER) ?? ''
    const decoded = decodeCheck(BASKER.slug, link)
    if (!decoded.ok) throw new Error('The link cannot be read.')
    const response = await page.request.post('/api/v1/checks', { data: decoded.input })
    expect(response.status()).toBe(200)
    const answer = checkResultSchema.parse(await response.json())
    const words = answer.verdicts.map(({ standing }) => VERDICT_LABELS[standing])
    expect(words.sort()).toEqual(['Can’t tell', 'High', 'Near a limit', 'No cited range', 'Past a limit'])
    for (const word of words) expect(typed.filter((verdict) => verdict.includes(`| ${word}`))).toHaveLength(1)
  })

  test('a verdict comes with its sentence, its row and who stands behind it', async ({ page }) => {
    await visit(page, toCheckAddress({ ...JOURNEY_CHECK, readings: [JOURNEY_READINGS.hot] }))
    const row = rowOf(page, 'Basking surface, lights on')
    await expect(row.locator('.sentence')).toContainText('Above 50 °C')
    await expect(row.getByRole('img')).toHaveCount(1)
    await row.locator('summary').filter({ hasText: 'The range used, and who says so' }).click()
    await expect(row).toContainText('figure 2')
  })

  test('a link pins its revision and says what the current one would answer otherwise', async ({ page }) => {
    await visit(page, toCheckAddress({ ...JOURNEY_CHECK, revision: 1 }))
    // Revision 1 gives the slab an upper limit of 54 °C; revision 4 raised it to 58 °C.
    const hot = rowOf(page, 'Basking surface, lights on')
    await expect(hot.locator('.answer')).toContainText('Near a limit')
    const note = page.getByRole('region', { name: 'Held against revision 1, which is no longer current' })
    await expect(note).toContainText('Revision 4 would answer otherwise for 1 reading')
    await expect(note.getByRole('listitem')).toHaveCount(1)
    await expect(note.getByRole('listitem')).toContainText(
      /Basking surface.*here\s*Near a limit.*there\s*High/,
    )
    await note.getByRole('link', { name: 'Hold against revision 4' }).click()
    await expect(page).toHaveURL(/\?c=1_4_/)
    await expect(hot.locator('.answer')).toContainText('High')
    await expect(note).toHaveCount(0)
  })

  test('what cannot be read is said at its field and at the top, and the rest is judged all the same', async ({
    page,
  }) => {
    await visit(page, CHECK)
    await fieldOf(page, 'Basking surface, lights on').fill('47')
    const wrong = fieldOf(page, 'Warm hide, lights on')
    await wrong.fill('warm')
    await wrong.blur()
    await expect(wrong).toHaveAttribute('aria-invalid', 'true')
    await expect(rowOf(page, 'Basking surface, lights on')).toContainText('Inside')
    const summary = page.getByRole('group', { name: /field needs another look/ })
    await summary.getByRole('link', { name: /Warm hide/ }).click()
    await expect(wrong).toBeFocused()
    await revisit(page)
    await expect(fieldOf(page, 'Warm hide, lights on')).toHaveValue('warm')
    await expect(fieldOf(page, 'Basking surface, lights on')).toHaveValue('47')
  })

  test('a number that looks like the other scale is asked back and answered in place', async ({ page }) => {
    await visit(page, CHECK)
    await fieldOf(page, 'Warm-end air, lights on').fill('91.5')
    const question = page.getByRole('group', { name: 'Question about Warm-end air, lights on' })
    await question.getByRole('button', { name: 'Yes, °F' }).click()
    // 91.5 °F is 33.1 °C, where 31 to 35 °C is asked.
    await expect(rowOf(page, 'Warm-end air, lights on').locator('.answer')).toContainText('Inside')
    await expect(question).toHaveCount(0)
    await expect(page).toHaveURL(/twdf/)
  })

  test('sharing copies the link and shows it', async ({ page, context }) => {
    await context.grantPermissions(['clipboard-read', 'clipboard-write'])
    await visit(page, toCheckAddress(JOURNEY_CHECK))
    await page.getByRole('button', { name: 'Share this check' }).click()
    await expect(page.getByText('The link is copied.')).toBeVisible()
    const shown = await page.getByRole('textbox', { name: 'Link to this check' }).inputValue()
    expect(await page.evaluate(() => navigator.clipboard.readText())).toBe(shown)
    const link = decodeCheck(BASKER.slug, new URL(shown).searchParams.get(CHECK_LINK_PARAMETER) ?? '')
    expect(link.ok && link.input.readings).toHaveLength(5)
    expect(link.ok && link.input.revision).toBe(4)
  })

  test('a link that was cut short, or made by a newer version, says so and leaves an empty form', async ({
    page,
  }) => {
    await visit(page, `${CHECK}?c=1_4_a`)
    await expect(page.getByRole('alert')).toContainText('This link cannot be read.')
    await expect(fieldOf(page, 'Basking surface, lights on')).toHaveValue('')
    await visit(page, `${CHECK}?c=9_4_aa_*tbdcp46`)
    await expect(page.getByRole('alert')).toContainText('made by a newer version')
  })

  test('on paper stand the readings, the verdicts and the address of the revision, and no form', async ({
    page,
    baseURL,
  }) => {
    await visit(page, toCheckAddress(JOURNEY_CHECK))
    await page.emulateMedia({ media: 'print' })
    await expect(page.getByText(`${baseURL}/species/${BASKER.slug}/revisions/4`)).toBeVisible()
    await expect(fieldOf(page, 'Basking surface, lights on')).toBeHidden()
    for (const label of ['High', 'Can’t tell', 'No cited range', 'Near a limit', 'Past a limit']) {
      await expect(page.locator('td').filter({ hasText: label }).first()).toBeVisible()
    }
    await expect(page.getByRole('note', { name: 'Invented' })).toBeVisible()
  })
})
