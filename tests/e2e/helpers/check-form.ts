import type { Locator, Page } from '@playwright/test'

/** The field of a place, such as "Basking surface, lights on". */
export function fieldOf(page: Page, place: string): Locator {
  return page.getByRole('textbox', { name: `${place}: what it reads`, exact: true })
}

/** The whole row of a place, with its verdict. */
export function rowOf(page: Page, place: string): Locator {
  return page.getByRole('listitem').filter({ has: fieldOf(page, place) })
}

/** Adds a place that the page has no row ready for. */
export async function addPlace(page: Page, position: string): Promise<void> {
  await page.getByRole('button', { name: 'Add another place' }).click()
  await page.getByRole('combobox', { name: 'Place' }).last().selectOption({ label: position })
}

/** Every verdict on the page in words, with its place; the order of the form is left aside. */
export async function readVerdicts(page: Page): Promise<string[]> {
  const rows = page.locator('.reading').filter({ has: page.locator('.verdict') })
  const words = await rows.evaluateAll((items) =>
    items.map((item) => {
      const textOf = (selector: string) =>
        item.querySelector(selector)?.textContent.replace(/\s+/g, ' ').trim()
      return [textOf('label'), textOf('.answer'), textOf('.sentence')].join(' | ')
    }),
  )
  return words.sort()
}
