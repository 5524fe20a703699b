import { darkTheme, type GlobalTheme, type GlobalThemeOverrides } from 'naive-ui'
import { computed, onBeforeUnmount, onMounted, ref, type ComputedRef } from 'vue'
import { darkOverrides, lightOverrides } from '../assets/naive-theme.js'
import { usePreferencesStore } from '../stores/preferences.js'

/** Theme of the component library's parts; our own parts follow the tokens in the style sheet. */
export function useNaiveTheme(): {
  theme: ComputedRef<GlobalTheme | null>
  overrides: ComputedRef<GlobalThemeOverrides>
} {
  const preferences = usePreferencesStore()
  const isSystemDark = ref(false)
  let query: MediaQueryList | null = null

  function follow(): void {
    isSystemDark.value = query?.matches ?? false
  }

  onMounted(() => {
    query = window.matchMedia('(prefers-color-scheme: dark)')
    query.addEventListener('change', follow)
    follow()
  })
  onBeforeUnmount(() => query?.removeEventListener('change', follow))

  const isDark = computed(
    () => preferences.theme === 'dark' || (preferences.theme === 'system' && isSystemDark.value),
  )
  return {
    theme: computed(() => (isDark.value ? darkTheme : null)),
    overrides: computed(() => (isDark.value ? darkOverrides : lightOverrides)),
  }
}
