import type { Preferences } from './page-renderer.js'

const COOKIE = /(?:^|;\s*)mg_(unit|length|theme)=([^;\s]*)/g

/** The reader's preferences as their cookies say; whatever is missing or unknown is °C, cm and the system's theme. */
export function readPreferences(cookieHeader: string | undefined): Preferences {
  const preferences: Preferences = { temperatureUnit: 'degC', lengthUnit: 'cm', theme: 'system' }
  for (const [, name, value] of cookieHeader?.matchAll(COOKIE) ?? []) {
    if (name === 'unit' && value === 'F') preferences.temperatureUnit = 'degF'
    if (name === 'length' && value === 'in') preferences.lengthUnit = 'in'
    if (name === 'theme' && (value === 'light' || value === 'dark')) preferences.theme = value
  }
  return preferences
}
