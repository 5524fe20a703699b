import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import pg from 'pg'
import type { Cluster } from '../../server/setup/cluster.mjs'
import { runProgram } from '../../server/setup/installation.mjs'
import { addresses, APP, prepareDatabase } from '../../server/setup/roles.mjs'
import { runCommand, type Run } from '../../server/setup/run.mjs'
import { say, secondsSince } from '../../server/setup/say.mjs'
import { startThrowawayCluster } from '../../server/setup/throwaway.mjs'
import { startBrowser } from './browser.js'
import { measureBarePage, measurePageScripts } from './client-size.js'
import { fillWithRevisions } from './fill-history.js'
import { fillWithSpecies } from './fill-species.js'
import { generateSpecies } from './generated-species.js'
import { measureShifts } from './layout-shift.js'
import { comparePaints } from './paint.js'
import { compareRates } from './rates.js'
import { compareSearches, listNameSearches, listOverlapSearches } from './search-times.js'
import { resultsFolder, startFloor, startProduct } from './servers.js'
import { quantile, writeMilliseconds, writeRatio } from './statistics.js'
import { writeTable, type Figure } from './table.js'

const DATABASES = { pages: 'bench', small: 'bench_small', large: 'bench_large' }
const SMALL = 1000
const LARGE = 100_000
const SHORT_HISTORY = 50
const LONG_HISTORY = 5000
/** An invented page at full depth, and a real one of physiology alone. */
const INVENTED_PAGE = 'apricator-salinarum'
const REAL_PAGE = 'sceloporus-occidentalis'

/** The public pages whose layout must hold still. `:source` stands for the first source of the list. */
const PUBLIC_PAGES = [
  '/',
  '/species',
  '/species?q=basker',
  '/species?q=nothing+of+this+name',
  `/species/${INVENTED_PAGE}`,
  `/species/${REAL_PAGE}`,
  `/species/${INVENTED_PAGE}/revisions`,
  `/species/${INVENTED_PAGE}/revisions/1`,
  `/species/${INVENTED_PAGE}/check`,
  '/check',
  '/sources',
  '/sources/:source',
  '/about',
  '/method',
  '/attributions',
  '/terms',
  '/privacy',
  '/no-such-page',
]

/** One part of the measurements, by the word that asks for it alone. */
interface Part {
  word: string
  title: string
  measure: (run: Run, cluster: Cluster) => Promise<Figure[]>
}

async function readText(url: string): Promise<string> {
  const response = await fetch(url)
  if (!response.ok) throw new Error(`${url} answered ${response.status}.`)
  return response.text()
}

function writeRate(rate: number): string {
  return `${Math.round(rate)}/s`
}

/** The answers of the product, given to the floor to send as they are. */
async function copyToFloor(cluster: Cluster, product: string, pages: string): Promise<void> {
  const owner = new pg.Client({ connectionString: addresses(cluster, DATABASES.pages).owner })
  await owner.connect()
  try {
    await owner.query('create table if not exists floor_body (slug text primary key, body text not null)')
    await owner.query(`grant select on floor_body to ${APP}`)
    for (const slug of [INVENTED_PAGE, REAL_PAGE]) {
      const body = await readText(`${product}/api/v1/species/${slug}`)
      await owner.query('insert into floor_body values ($1, $2) on conflict do nothing', [slug, body])
      writeFileSync(join(pages, `${slug}.html`), await readText(`${product}/species/${slug}`))
    }
  } finally {
    await owner.end()
  }
}

/** Product and floor on the small seed, with the same pages. */
async function startPair(run: Run, cluster: Cluster): Promise<{ product: string; floor: string }> {
  const pages = mkdtempSync(join(tmpdir(), 'mossgauge-bench-'))
  run.defer(() => rmSync(pages, { recursive: true, force: true }))
  const product = await startProduct(run, cluster, DATABASES.pages)
  await copyToFloor(cluster, product, pages)
  return { product, floor: await startFloor(run, cluster, DATABASES.pages, pages) }
}

const PARTS: Part[] = [
  {
    word: 'pages',
    title: 'Species pages, as data and as HTML',
    async measure(run, cluster) {
      const { product, floor } = await startPair(run, cluster)
      const figures: Figure[] = []
      for (const [slug, kind] of [
        [INVENTED_PAGE, 'full'],
        [REAL_PAGE, 'physiology only'],
      ] as const) {
        const size = Math.round((await readText(`${floor}/json/${slug}`)).length / 1000)
        const api = await compareRates(`${product}/api/v1/species/${slug}`, `${floor}/json/${slug}`)
        figures.push({
          what: `species page API, ${kind} page of ${size} kB`,
          measured: `${writeRatio(api.ratio)} (${writeRate(api.first)})`,
          beside: `Express and one query for the same bytes, ${writeRate(api.second)}`,
          bar: 'at least 0.6',
          isMet: api.ratio >= 0.6,
        })
      }
      const html = await compareRates(`${product}/species/${INVENTED_PAGE}`, `${floor}/html/${INVENTED_PAGE}`)
      figures.push({
        what: 'species page HTML, cached revision',
        measured: `${writeRatio(html.ratio)} (${writeRate(html.first)})`,
        beside: `Express sending the same bytes, ${writeRate(html.second)}`,
        bar: 'at least 0.7',
        isMet: html.ratio >= 0.7,
      })
      return figures
    },
  },
  {
    word: 'search',
    title: `Searches over ${SMALL} and ${LARGE} invented species`,
    async measure(run, cluster) {
      const startedAt = Date.now()
      for (const [database, count] of [
        [DATABASES.small, SMALL],
        [DATABASES.large, LARGE],
      ] as const) {
        await fillWithSpecies(addresses(cluster, database).superuser, count)
      }
      say(`  Generated the species in ${secondsSince(startedAt)}.`)
      const small = await startProduct(run, cluster, DATABASES.small)
      const large = await startProduct(run, cluster, DATABASES.large)
      const figures: Figure[] = []
      for (const [what, searches] of [
        ['search by name', listNameSearches(220)],
        ['filter by numeric overlap', listOverlapSearches(120)],
      ] as const) {
        const times = await compareSearches(small, large, searches)
        for (const [when, key] of [
          ['first asked', 'first'],
          ['asked again', 'again'],
        ] as const) {
          const few = quantile(times.small[key], 0.95)
          const many = quantile(times.large[key], 0.95)
          figures.push({
            what: `${what}, ${LARGE} species, p95, ${when}`,
            measured: `${writeRatio(many / few)} (${writeMilliseconds(many)})`,
            beside: `${SMALL} species, ${writeMilliseconds(few)}`,
            bar: 'at most 3',
            isMet: many / few <= 3,
          })
        }
      }
      return figures
    },
  },
  {
    word: 'history',
    title: `Histories of ${SHORT_HISTORY} and ${LONG_HISTORY} revisions`,
    async measure(run, cluster) {
      const database = DATABASES.small
      const { owner, superuser } = addresses(cluster, database)
      const [first, second] = [...generateSpecies(2)]
      if (first === undefined || second === undefined) throw new Error('No species were generated.')
      const client = new pg.Client({ connectionString: owner })
      await client.connect()
      const { rowCount } = await client.query('select from species limit 1')
      await client.end()
      if (!rowCount) await fillWithSpecies(superuser, SMALL)
      await fillWithRevisions(owner, first.slug, SHORT_HISTORY)
      await fillWithRevisions(owner, second.slug, LONG_HISTORY)
      const product = await startProduct(run, cluster, database)
      const path = (slug: string) => `${product}/api/v1/species/${slug}/revisions`
      const { first: short, second: long, ratio } = await compareRates(path(first.slug), path(second.slug))
      return [
        {
          what: `history of ${LONG_HISTORY} revisions, first screen, time`,
          measured: `${writeRatio(ratio)} (${writeRate(long)})`,
          beside: `${SHORT_HISTORY} revisions, ${writeRate(short)}`,
          bar: 'at most 1.2',
          isMet: ratio <= 1.2,
        },
      ]
    },
  },
  {
    word: 'client',
    title: 'What a phone loads, paints and shifts',
    async measure(run, cluster) {
      const { product, floor } = await startPair(run, cluster)
      const { browser, port } = await startBrowser()
      run.defer(() => browser.close())
      const bare = await measureBarePage()
      const scripts = await measurePageScripts(browser, `${product}/species/${INVENTED_PAGE}`)
      const paint = await comparePaints(
        `${product}/species/${INVENTED_PAGE}`,
        `${floor}/static/${INVENTED_PAGE}.html`,
        port,
      )
      const { items } = JSON.parse(await readText(`${product}/api/v1/sources`)) as { items: { id: string }[] }
      const paths = PUBLIC_PAGES.map((path) => path.replace(':source', items[0]?.id ?? ''))
      const shifts = await measureShifts(browser, product, paths)
      const worst = shifts.reduce((most, shift) => (shift.score > most.score ? shift : most))
      const failing = shifts.filter(({ score }) => score > 0.02)
      for (const { path, screen, score } of failing)
        say(`  Shifts: ${path} on a ${screen}, ${score.toFixed(3)}.`)
      return [
        {
          what: 'client JavaScript of the species page, gzip',
          measured: `${(scripts / 1000).toFixed(1)} kB`,
          beside: '',
          bar: 'at most 130 kB',
          isMet: scripts <= 130_000,
        },
        {
          what: 'the same, beside a bare page',
          measured: writeRatio(scripts / bare),
          beside: `Vue, Vue Router and Pinia alone, ${(bare / 1000).toFixed(1)} kB`,
          bar: 'at most 3',
          isMet: scripts / bare <= 3,
        },
        {
          what: 'largest contentful paint, throttled phone',
          measured: `${writeRatio(paint.ratio)} (${writeMilliseconds(paint.first)})`,
          beside: `the same HTML as a static file, ${writeMilliseconds(paint.second)}`,
          bar: 'at most 1.3',
          isMet: paint.ratio <= 1.3,
        },
        {
          what: `layout shift, worst of ${paths.length} pages on phone and desktop`,
          measured: `${worst.score.toFixed(3)} (${worst.path}, ${worst.screen})`,
          beside: '',
          bar: 'at most 0.02',
          isMet: worst.score <= 0.02,
        },
      ]
    },
  },
]

await runCommand(async (run) => {
  const startedAt = Date.now()
  const words = process.argv.slice(2)
  const unknown = words.filter((word) => !PARTS.some((part) => part.word === word))
  if (unknown.length > 0) {
    say(`There is no part ${unknown.join(', ')}; there are ${PARTS.map((part) => part.word).join(', ')}.`)
    return 1
  }
  const parts = PARTS.filter((part) => words.length === 0 || words.includes(part.word))
  say('Preparing a database of its own for the measurements.')
  const cluster = await startThrowawayCluster(run)
  const problem = 'The database for the measurements could not be filled.'
  for (const database of Object.values(DATABASES)) {
    await prepareDatabase(cluster, database)
    await runProgram(run, cluster, 'server/migrate', { database, problem })
  }
  await runProgram(run, cluster, 'seeds/seed', { words: ['small'], database: DATABASES.pages, problem })

  const figures: Figure[] = []
  for (const { title, measure } of parts) {
    const partStartedAt = Date.now()
    say(`${title} …`)
    const measured = await measure(run, cluster)
    figures.push(...measured)
    // Said at once too: a later part that breaks off takes nothing away.
    say(`${writeTable(measured)}\n  Measured in ${secondsSince(partStartedAt)}.`)
  }
  const table = writeTable(figures)
  mkdirSync(resultsFolder, { recursive: true })
  writeFileSync(join(resultsFolder, 'bench.txt'), `${table}\n`)
  say(`\n${table}\n`)
  say(`The measurements took ${secondsSince(startedAt)}.`)
  return 0
})
