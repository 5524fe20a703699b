import { createHead } from '@unhead/vue/client'
import { createWebHistory } from 'vue-router'
import { getJson } from './api/client.js'
import { createApp } from './app.js'
import type { PageState } from './composables/page-context.js'
import { createBrowserContext } from './composables/browser-context.js'
import { defaultPreferences } from './api/preferences.js'

function readPageState(): PageState {
  const text = document.getElementById('page-state')?.textContent
  if (!text) return { origin: location.origin, preferences: defaultPreferences, reads: [] }
  return JSON.parse(text) as PageState
}

const state = readPageState()
const { app, router } = createApp({
  history: createWebHistory(),
  head: createHead(),
  context: createBrowserContext(state, getJson),
  preferences: state.preferences,
})
await router.isReady()
app.mount('#app')
