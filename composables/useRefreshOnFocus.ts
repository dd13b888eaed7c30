const SHORTEST_ABSENCE_MS = 10_000

/** Asks again when a person comes back to this window, so that an open list does not grow old unseen. */
export function useRefreshOnFocus(refresh: () => unknown) {
  let leftAt = 0

  function change() {
    if (document.visibilityState === 'hidden') {
      leftAt = Date.now()
      return
    }
    if (leftAt > 0 && Date.now() - leftAt >= SHORTEST_ABSENCE_MS) refresh()
  }

  onMounted(() => document.addEventListener('visibilitychange', change))
  onBeforeUnmount(() => document.removeEventListener('visibilitychange', change))
}
