const SHOWN_MS = 10_000

/** What was just done on a page, and for ten seconds the way to take it back. */
export function useNotice() {
  const text = ref('')
  const undo = shallowRef<(() => unknown) | null>(null)
  let timer: ReturnType<typeof setTimeout> | undefined

  function say(said: string, back: (() => unknown) | null = null) {
    clear()
    text.value = said
    undo.value = back
    timer = setTimeout(clear, SHOWN_MS)
  }

  function clear() {
    clearTimeout(timer)
    text.value = ''
    undo.value = null
  }

  async function takeBack() {
    const back = undo.value
    clear()
    await back?.()
  }

  onBeforeUnmount(() => clearTimeout(timer))

  /** Handed to the notice whole: `<BaseToast v-bind="toast" />`. */
  const toast = computed(() => ({ text: text.value, undo: undo.value !== null, onUndo: takeBack, onClose: clear }))

  return { toast, say, clear }
}
