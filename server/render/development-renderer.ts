import { readFile } from 'node:fs/promises'
import type { Server } from 'node:http'
import { join } from 'node:path'
import { assembleDocument } from './document.js'
import type { PageRenderer, ServerEntry } from './page-renderer.js'

/**
 * Renders pages from `src` by Vite, which sends each change to the open page through `server`. Vite is a development
 * package, so it is loaded only here.
 */
export async function createDevelopmentRenderer(root: string, server: Server): Promise<PageRenderer> {
  const { createServer } = await import('vite')
  const vite = await createServer({
    root,
    appType: 'custom',
    server: { middlewareMode: true, hmr: { server } },
  })
  return {
    buildId: 'development',
    files: vite.middlewares,
    async render(url, input) {
      const shell = await vite.transformIndexHtml(url, await readFile(join(root, 'index.html'), 'utf8'))
      const entry = (await vite.ssrLoadModule('/src/entry-server.ts')) as ServerEntry
      return assembleDocument(shell, { ...(await entry.render(url, input)), cacheable: false }, '')
    },
    close: () => vite.close(),
  }
}
