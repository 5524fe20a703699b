import { ref, type Ref } from 'vue'

export type ShareOutcome = 'shared' | 'copied' | 'by-hand'

/** Hands a link on: by the device's own sheet where it has one, else to the clipboard, else as a text to copy by hand. */
export function useShare(): {
  outcome: Ref<ShareOutcome | null>
  share(link: { title: string; address: string }): Promise<void>
} {
  const outcome = ref<ShareOutcome | null>(null)

  async function trySheet(link: { title: string; address: string }): Promise<boolean> {
    const data = { title: link.title, url: link.address }
    if (typeof navigator.share !== 'function') return false
    try {
      await navigator.share(data)
      return true
    } catch (thrown) {
      // Closing the sheet is an answer too; anything else leaves the clipboard.
      return thrown instanceof DOMException && thrown.name === 'AbortError'
    }
  }

  async function tryClipboard(address: string): Promise<boolean> {
    try {
      await navigator.clipboard.writeText(address)
      return true
    } catch {
      return false
    }
  }

  return {
    outcome,
    async share(link) {
      outcome.value = null
      if (await trySheet(link)) outcome.value = 'shared'
      else outcome.value = (await tryClipboard(link.address)) ? 'copied' : 'by-hand'
    },
  }
}
