import { createPinia } from 'pinia'
import { createSSRApp, type App as VueApp } from 'vue'
import type { RouterHistory } from 'vue-router'
import type { VueHeadClient } from '@unhead/vue'
import App from './App.vue'
import './assets/fonts.css'
import './assets/base.css'
import { pageContextKey, type PageContext } from './composables/page-context.js'
import { createAppRouter } from './router/index.js'
import { usePreferencesStore } from './stores/preferences.js'
import type { Preferences } from './api/preferences.js'

export interface AppParts {
  history: RouterHistory
  head: VueHeadClient
  context: PageContext
  preferences: Preferences
}

/** The app with router and stores of its own, made anew for each request and each page. */
export function createApp(parts: AppParts): { app: VueApp; router: ReturnType<typeof createAppRouter> } {
  const app = createSSRApp(App)
  const router = createAppRouter(parts.history)
  const pinia = createPinia()
  app.use(pinia)
  usePreferencesStore(pinia).adopt(parts.preferences)
  app.use(parts.head)
  app.provide(pageContextKey, parts.context)
  app.use(router)
  return { app, router }
}
