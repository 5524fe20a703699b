import { defineStore } from 'pinia'
import { ref } from 'vue'
import type { LengthUnit, TemperatureUnit } from '../../shared/units.js'
import {
  defaultPreferences,
  writePreferenceCookies,
  type Preferences,
  type ThemeChoice,
} from '../api/preferences.js'

/** The reader's units and theme: kept in cookies, so that the server renders in them too. */
export const usePreferencesStore = defineStore('preferences', () => {
  const temperatureUnit = ref<TemperatureUnit>(defaultPreferences.temperatureUnit)
  const lengthUnit = ref<LengthUnit>(defaultPreferences.lengthUnit)
  const theme = ref<ThemeChoice>(defaultPreferences.theme)

  function adopt(preferences: Preferences): void {
    temperatureUnit.value = preferences.temperatureUnit
    lengthUnit.value = preferences.lengthUnit
    theme.value = preferences.theme
  }

  function keep(): void {
    writePreferenceCookies({
      temperatureUnit: temperatureUnit.value,
      lengthUnit: lengthUnit.value,
      theme: theme.value,
    })
  }

  function setTemperatureUnit(unit: TemperatureUnit): void {
    temperatureUnit.value = unit
    keep()
  }

  function setLengthUnit(unit: LengthUnit): void {
    lengthUnit.value = unit
    keep()
  }

  function setTheme(choice: ThemeChoice): void {
    theme.value = choice
    keep()
  }

  return { temperatureUnit, lengthUnit, theme, adopt, setTemperatureUnit, setLengthUnit, setTheme }
})
