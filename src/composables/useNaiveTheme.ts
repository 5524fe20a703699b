import type { GlobalTheme, GlobalThemeOverrides } from 'naive-ui'
import { computed, onBeforeUnmount, onMounted, ref, shallowRef, watch, type ComputedRef } from 'vue'
import { darkOverrides, lightOverrides } from '../assets/naive-theme.js'
import { usePreferencesStore } from '../stores/preferences.js'

/** Theme of the component library's parts; our own parts follow the tokens in the style sheet. */
export function useNaiveTheme(): {
  theme: ComputedRef<GlobalTheme | null>
  overrides: ComputedRef<GlobalThemeOverrides>
} {
  const preferences = usePreferencesStore()
  const isSystemDark = ref(false)
  const loadedDarkTheme = shallowRef<GlobalTheme | null>(null)
  let query: MediaQueryList | null = null

  function follow(): void {
    isSystemDark.value = query?.matches ?? false
  }

  const isDark = computed(
    () => preferences.theme === 'dark' || (preferences.theme === 'system' && isSystemDark.value),
  )

  onMounted(() => {
    query = window.matchMedia('(prefers-color-scheme: dark)')
    query.addEventListener('change', follow)
    follow()
    watch(
      isDark,
      async (dark) => {
        if (dark) loadedDarkTheme.value = (await import('../assets/naive-dark.js')).naiveDarkTheme
      },
      { immediate: true },
    )
  })
  onBeforeUnmount(() => query?.removeEventListener('change', follow))

  return {
    theme: computed(() => (isDark.value ? loadedDarkTheme.value : null)),
    overrides: computed(() => (isDark.value ? darkOverrides : lightOverrides)),
  }
}
