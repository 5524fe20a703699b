import { describe, expect, it } from 'vitest'
import { readPreferences } from '../../../server/render/preferences.js'

const USUAL = { temperatureUnit: 'degC', lengthUnit: 'cm', theme: 'system' }

describe('readPreferences', () => {
  it.each([
    [undefined, USUAL],
    ['', USUAL],
    ['mg_unit=F', { ...USUAL, temperatureUnit: 'degF' }],
    [
      'other=1; mg_unit=F; mg_length=in;mg_theme=dark',
      { temperatureUnit: 'degF', lengthUnit: 'in', theme: 'dark' },
    ],
    ['mg_theme=light', { ...USUAL, theme: 'light' }],
    ['mg_unit=K; mg_length=mile; mg_theme=<script>', USUAL],
    ['xmg_unit=F', USUAL],
  ])('reads %j', (header, preferences) => {
    expect(readPreferences(header)).toEqual(preferences)
  })
})
