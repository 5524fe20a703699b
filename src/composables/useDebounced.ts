import { onScopeDispose } from 'vue'

/** A function that acts once its calls have rested for `waitMs`; `flush` acts at once, `cancel` forgets. */
export function useDebounced<A extends unknown[]>(
  act: (...args: A) => void,
  waitMs: number,
): { call: (...args: A) => void; flush: () => void; cancel: () => void } {
  let timer: ReturnType<typeof setTimeout> | undefined
  let waiting: A | null = null

  function cancel(): void {
    clearTimeout(timer)
    waiting = null
  }

  function flush(): void {
    clearTimeout(timer)
    const args = waiting
    waiting = null
    if (args) act(...args)
  }

  onScopeDispose(cancel)
  return {
    call(...args) {
      waiting = args
      clearTimeout(timer)
      timer = setTimeout(flush, waitMs)
    },
    flush,
    cancel,
  }
}
