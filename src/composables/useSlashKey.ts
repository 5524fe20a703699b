import { onBeforeUnmount, onMounted, type Ref } from 'vue'

/** Whether typing at this element writes text, so that a letter must stay a letter. */
export function isTypingTarget(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false
  if (
    target.isContentEditable ||
    target instanceof HTMLTextAreaElement ||
    target instanceof HTMLSelectElement
  ) {
    return true
  }
  return (
    target instanceof HTMLInputElement && !['radio', 'checkbox', 'button', 'submit'].includes(target.type)
  )
}

/** Lets "/" put the focus in `input` from anywhere on the page where nothing is being typed. */
export function useSlashKey(input: Ref<HTMLInputElement | null>): void {
  function onKeydown(event: KeyboardEvent): void {
    if (event.key !== '/' || event.ctrlKey || event.metaKey || event.altKey || event.defaultPrevented) return
    if (isTypingTarget(event.target) || !input.value) return
    event.preventDefault()
    input.value.focus()
    input.value.select()
  }
  onMounted(() => document.addEventListener('keydown', onKeydown))
  onBeforeUnmount(() => document.removeEventListener('keydown', onKeydown))
}
