import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { gzipSync } from 'node:zlib'
import type { Browser } from 'playwright'
import { build } from 'vite'
import vue from '@vitejs/plugin-vue'
import { root } from '../../server/setup/places.mjs'

/** Where the bare page is built: inside the checkout, so that it finds the same packages. */
const BARE_FOLDER = join(root, 'node_modules/.cache/bare-page')

const BARE_FILES = {
  'index.html': '<!doctype html><div id="app"></div><script type="module" src="/main.ts"></script>',
  'App.vue': '<template><RouterView /></template>',
  'Page.vue': `<script setup lang="ts">
import { defineStore } from 'pinia'
import { ref } from 'vue'
const count = defineStore('count', () => ({ value: ref(0) }))()
</script>
<template><button @click="count.value += 1">{{ count.value }}</button></template>`,
  'main.ts': `import { createPinia } from 'pinia'
import { createSSRApp } from 'vue'
import { createRouter, createWebHistory } from 'vue-router'
import App from './App.vue'
import Page from './Page.vue'
const router = createRouter({ history: createWebHistory(), routes: [{ path: '/:rest(.*)*', component: Page }] })
createSSRApp(App).use(createPinia()).use(router).mount('#app')`,
}

function gzippedSize(content: Buffer | string): number {
  return gzipSync(content, { level: 9 }).length
}

/** Bytes of JavaScript, gzip, that a page of nothing but Vue, its router and Pinia loads. */
export async function measureBarePage(): Promise<number> {
  rmSync(BARE_FOLDER, { recursive: true, force: true })
  mkdirSync(BARE_FOLDER, { recursive: true })
  try {
    for (const [name, content] of Object.entries(BARE_FILES)) writeFileSync(join(BARE_FOLDER, name), content)
    await build({ root: BARE_FOLDER, configFile: false, plugins: [vue()], logLevel: 'error' })
    const assets = join(BARE_FOLDER, 'dist/assets')
    const scripts = readdirSync(assets).filter((name) => name.endsWith('.js'))
    return scripts.reduce((sum, name) => sum + gzippedSize(readFileSync(join(assets, name))), 0)
  } finally {
    rmSync(BARE_FOLDER, { recursive: true, force: true })
  }
}

/** Bytes of JavaScript, gzip, that a browser loads for a page before anybody touches it. */
export async function measurePageScripts(browser: Browser, url: string): Promise<number> {
  const page = await browser.newPage()
  const bodies: Promise<Buffer>[] = []
  page.on('response', (response) => {
    if (response.request().resourceType() === 'script') bodies.push(response.body())
  })
  await page.goto(url, { waitUntil: 'networkidle' })
  const contents = await Promise.all(bodies)
  await page.close()
  return contents.reduce((sum, content) => sum + gzippedSize(content), 0)
}
