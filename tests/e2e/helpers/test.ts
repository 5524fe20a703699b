import {
  expect,
  test as base,
  type Browser,
  type BrowserContext,
  type BrowserContextOptions,
} from '@playwright/test'

/**
 * Listens to every page of its contexts: a warning or error in the console (a hydration mismatch is one), an error nobody
 * caught, and a request to another host are complaints, and any complaint fails the test.
 */
export class Watch {
  readonly complaints: string[] = []
  /** Every address that was asked for. */
  readonly requests: string[] = []
  readonly #origin: string
  readonly #expected: RegExp[] = []
  readonly #contexts: BrowserContext[] = []

  constructor(baseURL: string) {
    this.#origin = new URL(baseURL).origin
  }

  /** Says of a console message that this test brings it about on purpose, such as the browser's line on an answer 404. */
  expect(message: RegExp): void {
    this.#expected.push(message)
  }

  follow(context: BrowserContext): void {
    context.on('console', (message) => {
      if (message.type() !== 'warning' && message.type() !== 'error') return
      const text = `${message.text()} (${message.location().url})`
      if (!this.#expected.some((expected) => expected.test(text))) {
        this.complaints.push(`console ${message.type()}: ${text}`)
      }
    })
    context.on('weberror', (error) => {
      this.complaints.push(`uncaught: ${error.error().stack ?? error.error().message}`)
    })
    context.on('request', (request) => {
      const url = request.url()
      this.requests.push(url)
      if (/^(data|blob):/.test(url)) return
      if (new URL(url).origin !== this.#origin) this.complaints.push(`request to another host: ${url}`)
    })
  }

  /** A browser context of its own, another visitor, listened to like the first. Closed with the test. */
  async open(browser: Browser, options: BrowserContextOptions = {}): Promise<BrowserContext> {
    const context = await browser.newContext({ baseURL: this.#origin, ...options })
    this.#contexts.push(context)
    this.follow(context)
    return context
  }

  async close(): Promise<void> {
    for (const context of this.#contexts) await context.close()
  }
}

/** Every browser test listens for complaints and fails on any. */
export const test = base.extend<{ watch: Watch }>({
  watch: [
    async ({ context, baseURL }, use) => {
      const watch = new Watch(baseURL ?? '')
      watch.follow(context)
      await use(watch)
      await watch.close()
      expect(watch.complaints).toEqual([])
    },
    { auto: true },
  ],
})
export { expect }
