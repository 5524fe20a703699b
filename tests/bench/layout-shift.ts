import type { Browser } from 'playwright'

const SCREENS = [
  { name: 'phone', viewport: { width: 390, height: 844 }, processorSlowdown: 4 },
  { name: 'desktop', viewport: { width: 1280, height: 900 }, processorSlowdown: 1 },
] as const

/** Slow 4G as Lighthouse has it: 150 ms there and back, 1.6 Mbit/s down. Fonts and scripts then come after the first paint. */
const NETWORK = {
  offline: false,
  latency: 150,
  downloadThroughput: (1.6 * 1024 * 1024) / 8,
  uploadThroughput: (750 * 1024) / 8,
}

/** A slow line on a busy machine. */
const LOAD_PATIENCE_MS = 120_000

declare global {
  interface Window {
    shifts: number
  }
}

/** A layout shift as the Layout Instability specification gives it; TypeScript's library does not know it yet. */
interface LayoutShift extends PerformanceEntry {
  value: number
  hadRecentInput: boolean
}

export interface Shift {
  path: string
  screen: string
  /** The sum of all shifts while the page loads: never less than the score of web vitals, which takes the worst five seconds. */
  score: number
}

/** How much each page shifts while it loads over a slow line, without a cache, on a phone and on a desktop. */
export async function measureShifts(
  browser: Browser,
  origin: string,
  paths: readonly string[],
): Promise<Shift[]> {
  const shifts: Shift[] = []
  for (const { name, viewport, processorSlowdown } of SCREENS) {
    for (const path of paths) {
      const context = await browser.newContext({ viewport })
      const page = await context.newPage()
      const session = await context.newCDPSession(page)
      await session.send('Network.enable')
      await session.send('Network.emulateNetworkConditions', NETWORK)
      await session.send('Emulation.setCPUThrottlingRate', { rate: processorSlowdown })
      await page.addInitScript(() => {
        window.shifts = 0
        new PerformanceObserver((list) => {
          for (const entry of list.getEntries() as LayoutShift[]) {
            if (!entry.hadRecentInput) window.shifts += entry.value
          }
        }).observe({ type: 'layout-shift', buffered: true })
      })
      await page.goto(origin + path, { waitUntil: 'networkidle', timeout: LOAD_PATIENCE_MS })
      // Fonts are in and two more frames are drawn.
      const score = await page.evaluate(async () => {
        await document.fonts.ready
        for (let frame = 0; frame < 2; frame += 1) await new Promise(requestAnimationFrame)
        return window.shifts
      })
      shifts.push({ path, screen: name, score })
      await context.close()
    }
  }
  return shifts
}
