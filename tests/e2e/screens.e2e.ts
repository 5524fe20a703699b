import type { Page } from '@playwright/test'
import { findViolations, measureSideways } from './helpers/accessibility.js'
import { CHECK_SCREENS } from './helpers/check-screens.js'
import { SCREENS, type Screen } from './helpers/screens.js'
import { expect, test } from './helpers/test.js'
import { visit } from './helpers/visit.js'

const SIZES = { phone: { width: 390, height: 844 }, desktop: { width: 1280, height: 900 } }
/** The narrowest screen that must do without being pushed sideways (WCAG 2.2, 1.4.10). */
const NARROWEST = { width: 320, height: 640 }

async function show(page: Page, screen: Screen): Promise<void> {
  const response = await visit(page, screen.path)
  expect(response?.status()).toBe(screen.status ?? 200)
  await screen.open?.(page)
  await page.evaluate(() => document.fonts.ready)
}

// Two loads and two looks of axe at a long page take a while on a busy machine.
test.describe.configure({ timeout: 240_000 })

for (const screen of [...SCREENS, ...CHECK_SCREENS]) {
  test.describe(`On ${screen.title}`, () => {
    for (const [size, viewport] of Object.entries(SIZES)) {
      const title =
        size === 'phone'
          ? 'axe finds nothing wrong on a phone, in light and in dark, and nothing can be pushed sideways at 320 px'
          : 'axe finds nothing wrong on a desktop, in light and in dark'
      test(title, async ({ page, context, watch, baseURL }) => {
        if (screen.status !== undefined) watch.expect(new RegExp(`status of ${screen.status}`))
        for (const theme of ['light', 'dark']) {
          await page.setViewportSize(viewport)
          await context.addCookies([{ name: 'mg_theme', value: theme, url: baseURL ?? '' }])
          await show(page, screen)
          await expect(page.locator('html')).toHaveAttribute('data-theme', theme)
          expect.soft(await findViolations(page)).toEqual([])
        }
        if (size === 'phone') {
          await page.setViewportSize(NARROWEST)
          expect(await measureSideways(page)).toBe(0)
        }
      })
    }
  })
}

test('letters are drawn with the type that ships with the site', async ({ page, watch, baseURL }) => {
  await visit(page, '/')
  await page.evaluate(() => document.fonts.ready)
  expect(await page.evaluate(() => getComputedStyle(document.body).fontFamily)).toMatch(/^"?Fira Sans/)
  const loaded = await page.evaluate(() =>
    [...document.fonts]
      .filter((font) => font.status === 'loaded')
      .map((font) => font.family.replaceAll('"', '')),
  )
  expect(loaded).toContain('Fira Sans')
  const fonts = watch.requests.filter((url) => url.endsWith('.woff2'))
  expect(fonts.length).toBeGreaterThan(0)
  for (const url of fonts) expect(new URL(url).origin).toBe(new URL(baseURL ?? '').origin)
})

test('moving through every part of the site by its links leaves the console silent', async ({ page }) => {
  await visit(page, '/')
  for (const [link, heading] of [
    ['Species', 'Species'],
    ['Sources', 'Sources'],
    ['Check readings', /check/i],
    ['About', /about/i],
    ['Method', /method/i],
    ['Attributions', /attribution/i],
    ['Terms and licence', /terms/i],
    ['Privacy', /privacy/i],
  ] as const) {
    await page.getByRole('link', { name: link, exact: true }).first().click()
    await expect(page.getByRole('heading', { level: 1 })).toHaveText(heading)
  }
  await page.goBack()
  await expect(page).toHaveURL('/terms')
})
