import { describe, expect, it } from 'vitest'
import { splitCommonNames } from '../../../seeds/names/common-names.js'

const names = (printed: string) => splitCommonNames(printed).map(({ name }) => name)

describe('splitting a printed list of common names', () => {
  it('parts at commas and semicolons and drops markup', () => {
    expect(
      splitCommonNames(
        'Southern Cricket Frog, Florida Cricket Frog (<i>A. g. dorsalis</i>); Western Toad (<i>Anaxyrus boreas boreas</i>),',
      ),
    ).toEqual([
      { name: 'Southern Cricket Frog', language: null, subspecies: null },
      { name: 'Florida Cricket Frog', language: null, subspecies: 'A. g. dorsalis' },
      { name: 'Western Toad', language: null, subspecies: 'Anaxyrus boreas boreas' },
    ])
  })

  it('takes a language that stands in brackets as its tag of the IANA language subtag registry', () => {
    expect(
      splitCommonNames(
        'Three-striped Poison Frog (English), groengestreepte gifkikker (Dutch), tidetide (Sranan), Idwi elijwayelekilea (Zulu)',
      ).map(({ name, language }) => [name, language]),
    ).toEqual([
      ['Three-striped Poison Frog', 'en'],
      ['groengestreepte gifkikker', 'nl'],
      ['tidetide', 'srn'],
      ['Idwi elijwayelekilea', 'zu'],
    ])
  })

  it('opens a name that stands in brackets as a whole', () => {
    expect(names('Eastern Red-backed Salamander, (Northern Redback Salamander)')).toEqual([
      'Eastern Red-backed Salamander',
      'Northern Redback Salamander',
    ])
  })

  it('parts two names joined by "or" and keeps a name that stands twice once', () => {
    expect(
      names("Woodhouse's Toad, Rocky Mountain Toad or Woodhouse's Toad (<i>B. w. woodhousii</i>)"),
    ).toEqual(["Woodhouse's Toad", 'Rocky Mountain Toad'])
  })

  it('drops the heading before names of subspecies', () => {
    expect(names('Brown Frog; Subspecies: Green Frog (<i>Rana clamitans melanota</i>)')).toEqual([
      'Brown Frog',
      'Green Frog',
    ])
  })

  it('finds nothing in an empty list', () => {
    expect(splitCommonNames('')).toEqual([])
  })
})
