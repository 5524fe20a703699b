import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { findDataFolder } from '../../../seeds/data-folder.js'
import { datasets } from '../../../seeds/datasets/all.js'
import { readDatasetFile } from '../../../seeds/importing/read-dataset.js'

/**
 * Counted apart from this code with Python's csv module over the files of `seeds/data`: rows read; rejected are the rows
 * whose note holds "FLAG" (a mean below the lowest value) or whose n holds a full stop; left out are SquamBase's rows
 * without "level=species_summary" and the EU's rows with "from memory" in the note.
 */
const counts = {
  amphitherm: { read: 4_401, accepted: 4_399, rejected: 2, leftOut: 0 },
  repttraits: { read: 1_279, accepted: 1_276, rejected: 3, leftOut: 0 },
  eu2007: { read: 13, accepted: 8, rejected: 0, leftOut: 5 },
  squambase: { read: 3_552, accepted: 1_938, rejected: 0, leftOut: 1_614 },
  globtherm: { read: 983, accepted: 983, rejected: 0, leftOut: 0 },
  moore2023: { read: 646, accepted: 644, rejected: 2, leftOut: 0 },
  intratherm: { read: 374, accepted: 374, rejected: 0, leftOut: 0 },
}

describe('the datasets that come with the product', () => {
  it('are these seven', () => {
    expect(datasets.map(({ id }) => id)).toEqual(Object.keys(counts))
  })

  it.each(datasets.map((definition) => ({ id: definition.id, definition })))(
    'holds the rows counted for $id',
    async ({ id, definition }) => {
      const file = await readDatasetFile(definition, join(findDataFolder(), definition.file))
      expect({
        read: file.rowsRead,
        accepted: file.accepted.length,
        rejected: file.rejected.length,
        leftOut: [...file.leftOut.values()].reduce((sum, rows) => sum + rows, 0),
      }).toEqual(counts[id as keyof typeof counts])
    },
  )

  it('say what their licence asks for', () => {
    for (const { attribution, licence, licenceUrl, doi } of datasets) {
      expect(attribution.length).toBeGreaterThan(40)
      expect(licence).not.toBe('')
      if (licence.startsWith('CC')) expect(licenceUrl).toMatch(/^https:\/\/creativecommons\.org\//)
      if (doi !== null)
        expect(attribution).toContain(doi === '10.6084/m9.figshare.24572683' ? '10.1038/' : doi)
    }
  })

  it('take no record that was written down from memory', async () => {
    for (const definition of datasets) {
      const file = await readDatasetFile(definition, join(findDataFolder(), definition.file))
      expect(file.accepted.filter(({ row }) => row.note.includes('from memory'))).toEqual([])
    }
  })
})
