import type { Page } from '@playwright/test'
import { fieldOf, rowOf } from './helpers/check-form.js'
import { BASKER } from './helpers/species.js'
import { expect, test } from './helpers/test.js'
import { visit } from './helpers/visit.js'

const MOST_PRESSES = 150

/** What has the focus: its name, and whether the focus can be seen on it. */
async function readFocus(page: Page): Promise<{ name: string; isMarked: boolean }> {
  return page.evaluate(() => {
    const element = document.activeElement
    if (!(element instanceof HTMLElement) || element === document.body) return { name: '', isMarked: true }
    const labels =
      element instanceof HTMLInputElement || element instanceof HTMLSelectElement
        ? [...(element.labels ?? [])]
        : []
    const name = [
      element.getAttribute('aria-label'),
      ...labels.map((label) => label.textContent),
      element.textContent,
    ]
      .join(' ')
      .replace(/\s+/g, ' ')
      .trim()
    // The mark may be on the element, on what stands for it (the face of a radio button), or on the frame around it.
    const around = [
      element,
      element.nextElementSibling,
      element.parentElement,
      element.parentElement?.parentElement,
    ]
    const isMarked = around.some((part) => {
      if (!(part instanceof HTMLElement)) return false
      const { outlineStyle, outlineWidth } = getComputedStyle(part)
      return outlineStyle !== 'none' && outlineWidth !== '0px'
    })
    return { name, isMarked }
  })
}

/** Presses Tab until the focus is on something of this name; every stop on the way must show its focus. */
async function tabTo(page: Page, name: string | RegExp): Promise<void> {
  const stops: string[] = []
  while (stops.length < MOST_PRESSES) {
    await page.keyboard.press('Tab')
    const focus = await readFocus(page)
    stops.push(focus.name)
    expect(focus, 'a stop of the keyboard shows its focus').toEqual({ ...focus, isMarked: true })
    if (typeof name === 'string' ? focus.name.includes(name) : name.test(focus.name)) return
  }
  throw new Error(`Tab never came to ${String(name)}; it came to ${stops.join(' | ')}`)
}

test.describe('By keyboard alone', () => {
  test('a species is found, read and checked', async ({ page }) => {
    await visit(page, '/')
    await expect(page.getByRole('combobox', { name: 'Find a species' })).toBeVisible()
    await page.keyboard.press('/')
    await page.keyboard.type('brack basker')
    await expect(page.getByRole('option', { name: new RegExp(BASKER.name) })).toBeVisible()
    await page.keyboard.press('ArrowDown')
    await page.keyboard.press('Enter')
    await expect(page).toHaveURL(`/species/${BASKER.slug}`)
    await expect(page.getByRole('heading', { level: 1 })).toContainText(BASKER.name)
    // The focus has come along, so the next stop is on this page.
    await expect(page.locator('#main')).toBeFocused()

    await tabTo(page, 'Juvenile')
    await page.keyboard.press('Enter')
    await expect(page).toHaveURL(/stage=juvenile/)
    await tabTo(page, /^Basking surface.*40 – 46/)
    await page.keyboard.press('Enter')
    await expect(page.getByRole('region', { name: 'Ranges' }).getByRole('table').first()).toBeVisible()
    await tabTo(page, 'Check my readings')
    await page.keyboard.press('Enter')
    await expect(page).toHaveURL(/\/check\?stage=juvenile/)

    await tabTo(page, 'Basking surface, lights on: what it reads')
    await page.keyboard.type('43')
    await expect(rowOf(page, 'Basking surface, lights on').locator('.answer')).toContainText('Inside')
    await tabTo(page, 'Unit: Basking surface')
    await tabTo(page, 'Warm-end air, lights on: what it reads')
    await page.keyboard.type('45')
    await expect(rowOf(page, 'Warm-end air, lights on').locator('.answer')).toContainText('Past a limit')
    await expect(fieldOf(page, 'Basking surface, lights on')).toHaveValue('43')
    await tabTo(page, 'Share this check')
  })

  test('the first stop skips to the page', async ({ page }) => {
    await visit(page, '/species')
    await page.keyboard.press('Tab')
    expect(await readFocus(page)).toEqual({ name: 'Skip to the page', isMarked: true })
    await page.keyboard.press('Enter')
    await expect(page.locator('#main')).toBeFocused()
  })

  test('the menu opens, closes by Escape and gives the focus back', async ({ page }) => {
    await visit(page, '/about')
    await tabTo(page, 'Menu and display')
    await page.keyboard.press('Enter')
    await tabTo(page, /^(Theme|Light|Dark|As the device)/)
    await page.keyboard.press('ArrowRight')
    await expect(page.locator('html')).toHaveAttribute('data-theme', /light|dark/)
    await page.keyboard.press('Escape')
    expect((await readFocus(page)).name).toContain('Menu and display')
    await expect(page.getByRole('radio', { name: 'Dark' })).toBeHidden()
  })

  test('filters are set and taken away', async ({ page }) => {
    await visit(page, '/species')
    await tabTo(page, /Amphibia/)
    await page.keyboard.press('Space')
    await expect(page).toHaveURL('/species?class=Amphibia')
    await tabTo(page, 'Add this filter')
    await page.keyboard.press('Enter')
    await expect(page.getByRole('alert')).toBeVisible()
    await page.keyboard.press('Shift+Tab')
    await page.keyboard.type('20')
    await page.keyboard.press('Enter')
    await expect(page).toHaveURL(/overlap=temperature\.basking-surface\.day\._20/)
  })
})
