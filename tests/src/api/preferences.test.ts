import { beforeEach, describe, expect, it } from 'vitest'
import {
  defaultPreferences,
  readPreferenceCookies,
  writePreferenceCookies,
} from '../../../src/api/preferences.js'

beforeEach(() => {
  for (const name of ['mg_unit', 'mg_length', 'mg_theme']) document.cookie = `${name}=; Max-Age=0; Path=/`
})

describe('the preference cookies', () => {
  it('give back what was written', () => {
    const chosen = { temperatureUnit: 'degF', lengthUnit: 'in', theme: 'dark' } as const
    writePreferenceCookies(chosen)
    expect(readPreferenceCookies(document.cookie, defaultPreferences)).toEqual(chosen)
  })

  it('carry the letters the server reads', () => {
    writePreferenceCookies({ temperatureUnit: 'degF', lengthUnit: 'cm', theme: 'system' })
    expect(document.cookie.split('; ').sort()).toEqual(['mg_length=cm', 'mg_theme=system', 'mg_unit=F'])
  })

  it('leave the rest as it was where one is missing or strange', () => {
    expect(readPreferenceCookies('mg_unit=K; mg_theme=pink; mg_length=in', defaultPreferences)).toEqual({
      ...defaultPreferences,
      lengthUnit: 'in',
    })
  })
})
