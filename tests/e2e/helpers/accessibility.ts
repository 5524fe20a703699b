import { AxeBuilder } from '@axe-core/playwright'
import type { Page } from '@playwright/test'

/**
 * What axe finds wrong with the page as it stands, a line for each element; all its rules, and the one on targets of at least
 * 24 by 24 px (WCAG 2.2, 2.5.8), which it leaves out unless asked.
 */
export async function findViolations(page: Page): Promise<string[]> {
  await showWhole(page)
  const { violations } = await new AxeBuilder({ page })
    .options({ rules: { 'target-size': { enabled: true } } })
    .analyze()
  return violations.flatMap(({ id, help, nodes }) =>
    nodes.map((node) => `${id}: ${help} at ${node.target.join(' ')} (${node.failureSummary ?? ''})`),
  )
}

/** Makes the window as high as the page: a link that is half under a bar that stays in sight is no smaller for it. */
async function showWhole(page: Page): Promise<void> {
  const width = page.viewportSize()?.width ?? 0
  const height = await page.evaluate(() => document.documentElement.scrollHeight)
  await page.setViewportSize({ width, height })
}

/** By how many pixels the page can be pushed sideways. */
export async function measureSideways(page: Page): Promise<number> {
  return page.evaluate(() => {
    const root = document.documentElement
    window.scrollTo(1000, window.scrollY)
    const moved = window.scrollX
    window.scrollTo(0, window.scrollY)
    return Math.max(moved, root.scrollWidth - root.clientWidth)
  })
}
