import type { Page, Response } from '@playwright/test'

/** Waits until the page answers to hand and key: Vue notes its application on the element it took over. */
export async function waitForLife(page: Page): Promise<void> {
  await page.waitForFunction(() => {
    const root = document.getElementById('app')
    return root !== null && '__vue_app__' in root
  })
}

/** Opens an address and waits until the page is alive. */
export async function visit(page: Page, address: string): Promise<Response | null> {
  const response = await page.goto(address)
  await waitForLife(page)
  return response
}

/** Opens the page anew and waits until it is alive. */
export async function revisit(page: Page): Promise<void> {
  await page.reload()
  await waitForLife(page)
}
