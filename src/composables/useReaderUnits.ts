import { computed, type ComputedRef } from 'vue'
import type { ReaderUnits } from '../../shared/format.js'
import { usePreferencesStore } from '../stores/preferences.js'

/** The units the reader has chosen, as the functions that write numbers take them. */
export function useReaderUnits(): ComputedRef<ReaderUnits> {
  const preferences = usePreferencesStore()
  return computed(() => ({ temperature: preferences.temperatureUnit, length: preferences.lengthUnit }))
}
