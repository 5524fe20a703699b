import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'
import express from 'express'
import { z } from 'zod'
import { assembleDocument } from './document.js'
import type { PageRenderer, ServerEntry } from './page-renderer.js'

const YEAR = '365d'
const manifestSchema = z.record(z.string(), z.array(z.string()))

/**
 * Renders pages with the built client (`dist/client`) and its server entry (`dist/ssr`), both below `dist`. Throws a
 * sentence where the build is missing.
 */
export async function createBuildRenderer(dist: string): Promise<PageRenderer> {
  const client = join(dist, 'client')
  const entryFile = join(dist, 'ssr', 'entry-server.js')
  const [shell, manifestText, entryText] = await Promise.all([
    readBuilt(join(client, 'index.html')),
    readBuilt(join(client, '.vite', 'ssr-manifest.json')),
    readBuilt(entryFile),
  ])
  const filesByModule = manifestSchema.parse(JSON.parse(manifestText))
  const entry = (await import(pathToFileURL(entryFile).href)) as ServerEntry
  const hash = createHash('sha256').update(shell).update(manifestText).update(entryText)

  // What Vite names by content may be kept for ever; the other files are looked at again each time.
  const hashed = express.static(join(client, 'assets'), {
    immutable: true,
    maxAge: YEAR,
    index: false,
    redirect: false,
  })
  const plain = express.static(client, { index: false, redirect: false })
  const files = express.Router()
  files.use('/assets', hashed)
  files.use((request, response, next) => {
    if (request.path === '/index.html') next()
    else plain(request, response, next)
  })

  return {
    buildId: hash.digest('base64url').slice(0, 16),
    files,
    async render(url, input) {
      const page = await entry.render(url, input)
      return assembleDocument(shell, page, writeLinks(page.modules, filesByModule, shell))
    },
    close: () => Promise.resolve(),
  }
}

/** Head tags for the styles and scripts of the modules a page used, but for those the shell asks for already. */
export function writeLinks(
  modules: readonly string[],
  filesByModule: Readonly<Record<string, string[]>>,
  shell: string,
): string {
  const files = new Set(modules.flatMap((module) => filesByModule[module] ?? []))
  const wanted = [...files].filter((file) => !shell.includes(`"${file}"`))
  return [
    ...wanted
      .filter((file) => file.endsWith('.css'))
      .map((file) => `<link rel="stylesheet" href="${file}" />`),
    ...wanted
      .filter((file) => file.endsWith('.js'))
      .map((file) => `<link rel="modulepreload" href="${file}" />`),
  ].join('\n')
}

async function readBuilt(file: string): Promise<string> {
  try {
    return await readFile(file, 'utf8')
  } catch (cause) {
    throw new Error(`The client is not built: ${file} cannot be read. Run npm run build.`, { cause })
  }
}
