import { onMounted, ref, type Ref } from 'vue'

const KEY = 'mossgauge recently checked'
const KEPT = 6

/** A species whose check was opened on this device. */
export interface RecentSpecies {
  slug: string
  scientificName: string
  isInvented: boolean
}

function isRecent(value: unknown): value is RecentSpecies {
  if (typeof value !== 'object' || value === null) return false
  return (
    'slug' in value &&
    typeof value.slug === 'string' &&
    'scientificName' in value &&
    typeof value.scientificName === 'string' &&
    'isInvented' in value &&
    typeof value.isInvented === 'boolean'
  )
}

/** The species checked last on this device, newest first; empty where nothing is or can be kept. */
export function readRecentSpecies(storage: Pick<Storage, 'getItem'>): RecentSpecies[] {
  try {
    const kept: unknown = JSON.parse(storage.getItem(KEY) ?? '[]')
    return Array.isArray(kept) ? kept.filter(isRecent).slice(0, KEPT) : []
  } catch {
    return []
  }
}

/** Puts a species first among those checked last. */
export function rememberSpecies(storage: Pick<Storage, 'getItem' | 'setItem'>, species: RecentSpecies): void {
  const { slug, scientificName, isInvented } = species
  const others = readRecentSpecies(storage).filter((other) => other.slug !== slug)
  try {
    storage.setItem(KEY, JSON.stringify([{ slug, scientificName, isInvented }, ...others].slice(0, KEPT)))
  } catch {
    // Storage may be full or forbidden; the check works without.
  }
}

/** The list for a page, known once the browser has taken over. */
export function useRecentSpecies(): { recent: Ref<RecentSpecies[]>; forget(): void } {
  const recent = ref<RecentSpecies[]>([])
  onMounted(() => {
    recent.value = readRecentSpecies(localStorage)
  })
  return {
    recent,
    forget() {
      recent.value = []
      localStorage.removeItem(KEY)
    },
  }
}
