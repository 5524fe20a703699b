import type { LengthUnit, TemperatureUnit } from '../../shared/units.js'

export type ThemeChoice = 'light' | 'dark' | 'system'

export interface Preferences {
  temperatureUnit: TemperatureUnit
  lengthUnit: LengthUnit
  theme: ThemeChoice
}

export const defaultPreferences: Preferences = { temperatureUnit: 'degC', lengthUnit: 'cm', theme: 'system' }

const YEAR_S = 365 * 24 * 60 * 60

function toPairs(preferences: Preferences): [string, string][] {
  return [
    ['mg_unit', preferences.temperatureUnit === 'degF' ? 'F' : 'C'],
    ['mg_length', preferences.lengthUnit],
    ['mg_theme', preferences.theme],
  ]
}

/** Leaves the preferences in the cookies that the server reads; nothing else is ever stored there. */
export function writePreferenceCookies(preferences: Preferences): void {
  const secure = location.protocol === 'https:' ? '; Secure' : ''
  for (const [name, value] of toPairs(preferences)) {
    document.cookie = `${name}=${value}; Path=/; Max-Age=${YEAR_S}; SameSite=Lax${secure}`
  }
}

/** The preferences the cookies hold; a missing or strange one keeps its value from `fallback`. */
export function readPreferenceCookies(cookies: string, fallback: Preferences): Preferences {
  const held = new Map(
    cookies.split(/;\s*/).map((pair): [string, string] => {
      const [name = '', value = ''] = pair.split('=')
      return [name, value]
    }),
  )
  const unit = held.get('mg_unit')
  const length = held.get('mg_length')
  const theme = held.get('mg_theme')
  return {
    temperatureUnit: unit === 'F' ? 'degF' : unit === 'C' ? 'degC' : fallback.temperatureUnit,
    lengthUnit: length === 'in' || length === 'cm' ? length : fallback.lengthUnit,
    theme: theme === 'light' || theme === 'dark' || theme === 'system' ? theme : fallback.theme,
  }
}
