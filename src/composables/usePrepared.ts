import { onServerPrefetch, shallowRef, watch, type ShallowRef } from 'vue'
import { usePageContext } from './page-context.js'

/**
 * Work that the server does once while it renders, such as reading Markdown: its outcome travels in the page's state, so
 * that the code behind it (loaded by `prepare`) never enters the first load of a browser. `key` names the outcome; work
 * that is overtaken by another key is dropped.
 */
export function usePrepared<T>(key: () => string, prepare: () => Promise<T>): ShallowRef<T | null> {
  const context = usePageContext()
  const outcome = shallowRef<T | null>(null)

  async function work(path: string): Promise<void> {
    const answer = await prepare()
    if (path !== key()) return
    context.store({ path, answer })
    outcome.value = answer
  }

  watch(
    key,
    (path) => {
      const known = context.recall(path)
      // Only `work` stores under these keys, so what is recalled is what it made.
      outcome.value = known !== null && 'answer' in known ? (known.answer as T) : null
      if (outcome.value === null && !context.isServer) void work(path)
    },
    { immediate: true },
  )
  onServerPrefetch(async () => {
    if (outcome.value === null) await work(key())
  })
  return outcome
}
