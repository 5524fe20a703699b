import { join } from 'node:path'
import { beforeAll, describe, expect, it } from 'vitest'
import { findDataFolder } from '../../../seeds/data-folder.js'
import { readTaxonomy, type Taxonomy } from '../../../seeds/names/taxonomy.js'

let taxonomy: Taxonomy
beforeAll(async () => {
  taxonomy = await readTaxonomy(join(findDataFolder(), 'taxonomy.csv'))
})

const describePage = (name: string) =>
  taxonomy.describe(
    name,
    { name, authority: 'Printer, 1900', class: 'Insecta', order: 'Diptera', family: null },
    'A dataset',
  )

// The expected names were read in the file by hand.
describe('which page a printed name belongs to', () => {
  it.each([
    ['an accepted name', 'Pogona vitticeps', 'Pogona vitticeps'],
    ['an old combination', 'Bufo marinus', 'Rhinella marina'],
    ['a synonym of a lizard', 'Ameiva festiva', 'Holcosus festivus'],
    ['a name that a list has updated', 'Crotalus ehecatl', 'Crotalus culminatus'],
    ['a name no list matched', 'Cataglyphis bicolor', 'Cataglyphis bicolor'],
    ['a name that stands in no list', 'Nomen nusquam', 'Nomen nusquam'],
    ['a species that was split', 'Agama agama', 'Agama agama'],
    ['an old name with two accepted names', 'Bufo boreas', 'Bufo boreas'],
    ['a duplicated name', 'Thamnophis conanti', 'Thamnophis conanti'],
    ['an ambiguous name', 'Liolaemus islugensis', 'Liolaemus islugensis'],
  ])('is told for %s', (_, printed, page) => {
    expect(taxonomy.toPageName(printed)).toBe(page)
  })
})

describe('what a page says of its taxon', () => {
  const statusOf = (name: string) =>
    describePage(name).names.find(({ kind }) => kind === 'scientific')?.status

  it('says whether a list accepts the name', () => {
    expect(statusOf('Pogona vitticeps')).toBe('accepted')
    expect(statusOf('Cataglyphis bicolor')).toBe('unresolved')
    expect(statusOf('Agama agama')).toBe('needs-a-person')
    expect(statusOf('Bufo boreas')).toBe('needs-a-person')
  })

  it('names what the lists offer, between which a person has to choose', () => {
    expect(describePage('Bufo boreas').names[0]?.provenance).toContain('Anaxyrus boreas, Anaxyrus nelsoni')
  })

  it('keeps old names as synonyms of the accepted one, in alphabetical order', () => {
    const { names } = describePage('Rana sylvatica')
    expect(names.filter(({ kind }) => kind === 'synonym').map(({ name }) => name)).toEqual([
      'Lithobates sylvatica',
      'Lithobates sylvaticus',
    ])
  })

  it('takes the facts of an accepted name that only an old name leads to from that old name', () => {
    const { names, classification } = describePage('Holcosus festivus')
    expect(names.map(({ kind, name, status }) => ({ kind, name, status }))).toEqual([
      { kind: 'scientific', name: 'Holcosus festivus', status: 'accepted' },
      { kind: 'synonym', name: 'Ameiva festiva', status: null },
    ])
    expect(classification).toMatchObject({ class: 'Reptilia', order: 'Squamata', family: 'Teiidae' })
  })

  it('gives common names with their provenance and says which come from memory', () => {
    const { names } = describePage('Trachemys scripta')
    expect(names.filter(({ kind }) => kind === 'common').map(({ name }) => name)).toContain('Pond slider')
    expect(names.find(({ name }) => name === 'Pond slider')?.provenance).toMatch(/^name from memory/)
    const frog = describePage('Xenopus laevis').names.find(({ name }) => name === 'African Clawed Frog')
    expect(frog?.provenance).toBe('AmphibiaWeb name list')
  })

  it('tells class, order, family, conservation and habits, and where they were read', () => {
    expect(describePage('Thamnophis sirtalis').classification).toEqual({
      class: 'Reptilia',
      order: 'Squamata',
      suborder: 'Serpentes',
      family: 'Colubridae',
      conservation: 'Least Concern',
      activeTime: 'Diurnal',
      microhabitat: 'Semi-Aquatic',
      region: 'Nearctic',
      provenance:
        'ReptTraits v1.2 via letsRept (Reptile Database names, 2023; accepted name May 2025); conservation category printed there as “Least Concern”',
    })
  })

  it('leaves the suborder empty where the list only repeats the order', () => {
    expect(describePage('Trachemys scripta').classification).toMatchObject({
      order: 'Testudines',
      suborder: null,
    })
  })

  it('describes a taxon of no list by the row of its dataset', () => {
    expect(describePage('Nomen nusquam')).toMatchObject({
      names: [
        {
          kind: 'scientific',
          name: 'Nomen nusquam',
          authority: 'Printer, 1900',
          status: 'unresolved',
          provenance: 'as printed in A dataset; in no list of names',
        },
      ],
      classification: { class: 'Insecta', order: 'Diptera', family: null, conservation: null },
    })
  })
})
