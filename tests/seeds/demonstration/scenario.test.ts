import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { checkReadings } from '../../../shared/checker/check-readings.js'
import type { CheckPage } from '../../../shared/checker/check.js'
import type { Reading } from '../../../shared/checker/reading.js'
import { lintPage, type LintPage } from '../../../shared/lints/lint-page.js'
import { findCitedSources } from '../../../shared/prose-citations.js'
import { pageItemSchema, type PageItem } from '../../../shared/revisions.js'
import { findYear } from '../../../shared/citation.js'
import type { SourceBrief } from '../../../shared/sources.js'
import { DELIBERATE_FLAWS } from '../../../seeds/demonstration/flaws.js'
import { DEMONSTRATION_SPECIES } from '../../../seeds/demonstration/scenario.js'
import { SOURCES, toReference, type SourceKey } from '../../../seeds/demonstration/sources.js'
import { toItemId } from '../../../seeds/demonstration/item-ids.js'
import { toItems } from '../../../seeds/demonstration/to-items.js'
import { testId } from '../../helpers/page-content.js'

const sourceKeys = Object.keys(SOURCES) as SourceKey[]
const sourceIds = new Map(sourceKeys.map((key, index) => [key, testId(index + 1)]))
const sources: Record<string, SourceBrief> = Object.fromEntries(
  sourceKeys.map((key) => {
    const id = sourceIds.get(key) ?? ''
    return [
      id,
      { id, kind: SOURCES[key].kind, doi: null, csl: SOURCES[key].csl, asPrinted: null, isInvented: true },
    ]
  }),
)

/** A page's items as the lints and the checker read them. */
function toPage(items: readonly PageItem[]): LintPage {
  const classification = items.find((item) => item.kind === 'classification')
  return {
    classification:
      classification === undefined ? null : { itemId: classification.itemId, row: classification.row },
    ranges: items.flatMap((item) => {
      if (item.kind !== 'range') return []
      const evidence = items.flatMap((piece) =>
        piece.kind === 'evidence' && piece.parentItemId === item.itemId
          ? [{ itemId: piece.itemId, row: piece.row }]
          : [],
      )
      return [{ itemId: item.itemId, row: item.row, evidence }]
    }),
    physiology: items.flatMap((item) =>
      item.kind === 'physiology' ? [{ itemId: item.itemId, row: item.row, dataset: null, studies: [] }] : [],
    ),
    sources,
  }
}

const newest = DEMONSTRATION_SPECIES.map((species) => {
  const items = toItems(species.key, species.revisions.at(-1)!.content, sourceIds)
  return { key: species.key, items, page: toPage(items) }
})

function findPage(key: string): LintPage {
  return newest.find((species) => species.key === key)!.page
}

describe('the scenario', () => {
  it('has eight species', () => {
    expect(newest).toHaveLength(8)
    expect(new Set(newest.map(({ key }) => key)).size).toBe(8)
  })

  it.each(newest)('fits the form of a page: $key', ({ items }) => {
    for (const item of items) expect(pageItemSchema.safeParse(item).error).toBeUndefined()
    expect(new Set(items.map(({ itemId }) => itemId)).size).toBe(items.length)
  })

  it.each(newest)('has day and night, two life stages, limits and physiology: $key', ({ page }) => {
    const rows = page.ranges.map(({ row }) => row)
    expect(new Set(rows.map(({ period }) => period))).toEqual(new Set(['day', 'night', 'any']))
    expect(new Set(rows.map(({ lifeStage }) => lifeStage)).size).toBeGreaterThanOrEqual(3)
    expect(rows.some(({ lowerLimit }) => lowerLimit !== null)).toBe(true)
    expect(rows.some(({ upperLimit }) => upperLimit !== null)).toBe(true)
    const quantities = page.physiology.map(({ row }) => (row.form === 'cited' ? row.quantity : null))
    for (const quantity of [
      'selected-body-temperature',
      'critical-thermal-minimum',
      'critical-thermal-maximum',
    ]) {
      expect(quantities).toContain(quantity)
    }
  })

  it.each(newest)('rests every range on two sources: $key', ({ page }) => {
    for (const { evidence } of page.ranges) {
      expect(new Set(evidence.map(({ row }) => row.sourceId)).size).toBeGreaterThanOrEqual(2)
    }
  })

  it.each(newest)('has sources that disagree on most ranges: $key', ({ page }) => {
    const disagreeing = page.ranges.filter(({ evidence }) => {
      const said = evidence.map(({ row }) => [row.statement, row.low, row.high, row.mean, row.sd].join(' '))
      return new Set(said).size > 1
    })
    expect(disagreeing.length).toBeGreaterThan(page.ranges.length / 2)
  })

  it.each(newest)('cites only its own sources in prose, every placeholder resolved: $key', ({ items }) => {
    const prose = items.filter((item) => item.kind === 'prose')
    expect(prose.length).toBeGreaterThanOrEqual(3)
    for (const { row } of prose) {
      expect(findCitedSources(row.markdown).every((id) => id in sources)).toBe(true)
      expect(row.markdown).not.toMatch(/\[@[a-z]/)
    }
    expect(prose.flatMap(({ row }) => findCitedSources(row.markdown)).length).toBeGreaterThanOrEqual(3)
  })

  it('has a species with brumation and one without a gradient', () => {
    const rimeback = findPage('rimeback-snake').ranges.map(({ row }) => row)
    expect(
      rimeback.some(({ season, position }) => season === 'brumation' && position === 'whole-enclosure'),
    ).toBe(true)
    const spider = findPage('tunnel-spider').ranges.map(({ row }) => row.position)
    expect(new Set(spider)).toEqual(new Set(['whole-enclosure', 'substrate']))
  })

  it('gives the desert basker a revision line with one change at a time', () => {
    const { revisions } = DEMONSTRATION_SPECIES.find(({ key }) => key === 'salt-pan-lizard')!
    expect(revisions.length).toBeGreaterThanOrEqual(3)
    const contents = revisions.map(({ content }) => toItems('salt-pan-lizard', content, sourceIds))
    const basking = toItemId('salt-pan-lizard/range/temperature.basking-surface.day.any.adult.')
    const bounds = contents.map((items) => {
      const item = items.find(({ itemId }) => itemId === basking)
      return item?.kind === 'range' ? [item.row.low, item.row.high] : null
    })
    expect(bounds.slice(0, 2)).toEqual([
      [40, 46],
      [44, 50],
    ])
    const hides = contents.map(
      (items) => toPage(items).ranges.filter(({ row }) => row.position === 'humid-hide').length,
    )
    expect(hides.slice(0, 3)).toEqual([0, 0, 3])
  })

  it('publishes in the past, each page in order', () => {
    for (const { revisions } of DEMONSTRATION_SPECIES) {
      const dates = revisions.map(({ publishedAt }) => publishedAt)
      expect(dates).toEqual([...dates].sort())
      for (const date of dates) expect(date).toMatch(/^2026-(0[1-9]|10)-/)
    }
  })
})

describe('the names of the scenario', () => {
  const scientific = newest.flatMap(({ items }) =>
    items.flatMap((item) => (item.kind === 'name' && item.row.kind !== 'common' ? [item.row.name] : [])),
  )

  it('are two Latin words each', () => {
    for (const name of scientific) expect(name).toMatch(/^[A-Z][a-z]+ [a-z]+$/)
  })

  it('have a genus that stands nowhere in the real data', () => {
    const folder = join(import.meta.dirname, '../../../seeds/data')
    const real = readdirSync(folder)
      .filter((file) => file.endsWith('.csv'))
      .map((file) => readFileSync(join(folder, file), 'utf8').toLowerCase())
    for (const genus of new Set(scientific.map((name) => name.split(' ')[0]!.toLowerCase()))) {
      expect(real.some((text) => text.includes(genus))).toBe(false)
    }
  })

  it('stand in an invented family of a real class and order', () => {
    for (const { page } of newest) {
      const row = page.classification!.row
      expect(['Squamata', 'Testudines', 'Anura', 'Araneae']).toContain(row.order)
      expect(row.family).toMatch(/idae$/)
      expect(row.provenance).toContain('Invented')
    }
  })
})

describe('the sources of the scenario', () => {
  it('say of themselves that they are invented, and are told apart by their reference', () => {
    for (const key of sourceKeys) {
      expect(toReference(key)).toContain('(invented)')
      expect(findYear(SOURCES[key].csl)).toBeGreaterThan(2005)
    }
    expect(new Set(sourceKeys.map(toReference)).size).toBe(sourceKeys.length)
  })

  it('are all cited', () => {
    const cited = new Set(
      newest.flatMap(({ page }) => [
        ...page.ranges.flatMap(({ evidence }) => evidence.map(({ row }) => row.sourceId)),
        ...page.physiology.map(({ row }) => (row.form === 'cited' ? row.sourceId : '')),
      ]),
    )
    expect(sourceKeys.filter((key) => !cited.has(sourceIds.get(key)!))).toEqual([])
  })
})

describe('the deliberate flaws', () => {
  it('are eight different ones, one for each species', () => {
    expect(new Set(DELIBERATE_FLAWS.map(({ lint }) => lint)).size).toBe(8)
    expect(DELIBERATE_FLAWS.map(({ species }) => species)).toEqual(newest.map(({ key }) => key))
  })

  it.each(DELIBERATE_FLAWS)(
    'are found, and nothing else is: $lint of $species, $where',
    ({ species, lint }) => {
      expect(lintPage(findPage(species), 2026).map(({ id }) => id)).toEqual([lint])
    },
  )
})

describe('a check on the desert basker', () => {
  const { revisions } = DEMONSTRATION_SPECIES.find(({ key }) => key === 'salt-pan-lizard')!
  const page: CheckPage = {
    ...findPage('salt-pan-lizard'),
    species: {
      id: testId(90),
      slug: 'apricator-salinarum',
      scientificName: 'Apricator salinarum',
      isInvented: true,
    },
    revision: {
      id: testId(91),
      number: revisions.length,
      publishedAt: revisions.at(-1)!.publishedAt,
      summary: revisions.at(-1)!.summary,
      broughtBy: { form: 'demonstration' },
    },
    currentRevisionNumber: revisions.length,
  }
  const reading = (part: Partial<Reading>): Reading => ({
    parameter: 'temperature',
    position: 'cool-end-air',
    period: 'day',
    values: [26],
    unit: 'degC',
    instrument: 'probe-thermometer',
    accuracy: null,
    resolution: null,
    uvMeaning: null,
    surface: null,
    ...part,
  })
  const findStanding = (part: Partial<Reading>) =>
    checkReadings(page, {
      slug: 'apricator-salinarum',
      revision: null,
      season: 'active',
      lifeStage: 'adult',
      roomTemperature: null,
      readings: [reading(part)],
    }).verdicts[0]!.standing

  it.each<[string, Partial<Reading>]>([
    ['high', { position: 'basking-surface', values: [54.5], instrument: 'infrared-thermometer' }],
    ['unclear', { values: [27.8] }],
    [
      'no-range',
      {
        parameter: 'relative-humidity',
        position: 'warm-end-air',
        values: [35],
        unit: 'percentRh',
        instrument: 'capacitive-hygrometer',
      },
    ],
    ['near', { position: 'cool-end-air', period: 'night', values: [12.8] }],
    ['past', { position: 'warm-hide', values: [41] }],
    ['inside', { values: [26] }],
  ])('can come out as %s', (standing, part) => {
    expect(findStanding(part)).toBe(standing)
  })
})
