import { onBeforeUnmount, onMounted, ref, watch, type Ref } from 'vue'
import type { CheckTexts, Checker } from './useChecker.js'
import { useDebounced } from './useDebounced.js'

const WAIT_MS = 250
const KEY = 'mossgauge check '
const VERSION = 1

interface Draft {
  version: typeof VERSION
  /** The checks the address named when this was kept: the same address brings the texts back. */
  links: string[]
  texts: CheckTexts
}

function isTexts(value: unknown): value is CheckTexts {
  if (typeof value !== 'object' || value === null || !('rows' in value) || !('room' in value)) return false
  const { rows, room } = value
  const isRoom =
    typeof room === 'object' &&
    room !== null &&
    'text' in room &&
    typeof room.text === 'string' &&
    'unit' in room
  return isRoom && Array.isArray(rows) && rows.every(isRowTexts)
}

function isRowTexts(row: unknown): boolean {
  if (typeof row !== 'object' || row === null || !('form' in row) || !('settled' in row)) return false
  const { form, settled } = row
  if (typeof form !== 'object' || form === null || !Array.isArray(settled)) return false
  return Object.entries(form).every(([key, field]) => {
    if (key === 'values') return Array.isArray(field) && field.every((text) => typeof text === 'string')
    if (key === 'surface') {
      return (
        field === null || Object.values(Object(field) as object).every((text) => typeof text === 'string')
      )
    }
    return typeof field === 'string'
  })
}

/** Reads what was kept for a species; null where there is nothing, or nothing that can be read. */
export function readDraft(storage: Pick<Storage, 'getItem'>, slug: string): Draft | null {
  try {
    const kept: unknown = JSON.parse(storage.getItem(KEY + slug) ?? 'null')
    if (typeof kept !== 'object' || kept === null || !('version' in kept) || kept.version !== VERSION)
      return null
    if (!('links' in kept) || !('texts' in kept) || !isTexts(kept.texts) || !Array.isArray(kept.links))
      return null
    return { version: VERSION, links: kept.links.map(String), texts: kept.texts }
  } catch {
    return null
  }
}

/** Keeps what is typed for a species, or forgets it when nothing is. Storage may be full or forbidden; then nothing is kept. */
export function keepDraft(
  storage: Pick<Storage, 'setItem' | 'removeItem'>,
  slug: string,
  texts: CheckTexts,
  links: string[],
): void {
  try {
    if (texts.rows.length === 0 && texts.room.text.trim() === '') {
      storage.removeItem(KEY + slug)
      return
    }
    const draft: Draft = { version: VERSION, links, texts }
    storage.setItem(KEY + slug, JSON.stringify(draft))
  } catch {
    // A check without a draft is still a check.
  }
}

function isSame(a: CheckTexts, b: CheckTexts): boolean {
  return JSON.stringify(a) === JSON.stringify(b)
}

/**
 * Brings back what was typed on this device, the unfinished included, and keeps it while it is typed. A link to another
 * check is shown as it is; what was typed before waits behind `waiting`.
 */
export function useCheckDraft(
  slug: () => string,
  checker: Checker,
  links: () => { address: string | null; own: string | null },
): { waiting: Ref<(() => void) | null> } {
  const waiting = ref<(() => void) | null>(null)
  const keep = useDebounced(() => {
    const { address, own } = links()
    const named = [address, own].filter((link) => link !== null)
    keepDraft(localStorage, slug(), checker.takeTexts(), named)
  }, WAIT_MS)

  function restore(): void {
    const draft = readDraft(localStorage, slug())
    if (draft === null || isSame(draft.texts, checker.takeTexts())) return
    const { address } = links()
    if (address === null || draft.links.includes(address)) checker.putTexts(draft.texts)
    else {
      waiting.value = () => {
        checker.putTexts(draft.texts)
        waiting.value = null
      }
    }
  }

  onMounted(() => {
    restore()
    // Opening somebody's link is no typing: the draft behind it stays until there is some.
    watch(
      () => JSON.stringify(checker.takeTexts()),
      () => keep.call(),
    )
    window.addEventListener('pagehide', keep.flush)
  })
  onBeforeUnmount(() => {
    window.removeEventListener('pagehide', keep.flush)
    keep.flush()
  })
  return { waiting }
}
