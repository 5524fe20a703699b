import { createHead } from '@unhead/vue/client'
import { mount, type VueWrapper } from '@vue/test-utils'
import { createPinia } from 'pinia'
import { defineComponent, h, type Component } from 'vue'
import { createMemoryHistory, type Router } from 'vue-router'
import { createBrowserContext } from '../../src/composables/browser-context.js'
import { pageContextKey, type PageContext, type StoredRead } from '../../src/composables/page-context.js'
import { createAppRouter } from '../../src/router/index.js'
import { defaultPreferences } from '../../src/api/preferences.js'

/** A promise that the test settles. */
export interface Deferred {
  path: string
  resolve(answer: unknown): void
  reject(error: unknown): void
  signal: AbortSignal | undefined
}

/** A page's context whose reads wait until the test answers them. */
export function makeContext(reads: StoredRead[] = []): { context: PageContext; asked: Deferred[] } {
  const asked: Deferred[] = []
  const context = createBrowserContext(
    { origin: 'https://moss.example', preferences: defaultPreferences, reads },
    (path, signal) =>
      new Promise((resolve, reject) => {
        asked.push({ path, resolve, reject, signal })
      }),
  )
  return { context, asked }
}

/** Mounts a component with router, stores, head and the given context. */
export async function mountPage(
  component: Component,
  context: PageContext,
  props: Record<string, unknown> = {},
  address = '/about',
): Promise<{ wrapper: VueWrapper; router: Router }> {
  const router = createAppRouter(createMemoryHistory())
  await router.push(address)
  const wrapper = mount(component, {
    props,
    attachTo: document.body,
    global: {
      plugins: [router, createPinia(), createHead()],
      provide: { [pageContextKey as symbol]: context },
    },
  })
  return { wrapper, router }
}

/** Runs a composable inside a component that shows nothing. */
export async function runComposable<T>(
  use: () => T,
  context: PageContext,
  address?: string,
): Promise<{ result: T; wrapper: VueWrapper; router: Router }> {
  let result: T | undefined
  const host = defineComponent({
    setup() {
      result = use()
      return () => h('div')
    },
  })
  const { wrapper, router } = await mountPage(host, context, {}, address)
  return { result: result as T, wrapper, router }
}
