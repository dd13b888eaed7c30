import { keptPrefix } from '~~/composables/keptPrefix'
import { useSessionStore } from '~~/stores/session'
import type { NowLine } from '~~/utils/contract/now'
import { typedLines } from '~~/utils/now/typedLines'

/** What this person has typed on this device and not recorded yet; known once the page stands in the browser. */
export function useTypedLines() {
  const session = useSessionStore()
  const lines = ref<NowLine[]>([])

  onMounted(() => {
    const prefix = keptPrefix(session.user?.id)
    const names = [...kept('sessionStorage'), ...kept('localStorage')].filter(key => key.startsWith(prefix)).map(key => key.slice(prefix.length))
    lines.value = typedLines(names)
  })

  return lines
}

/** An empty list is nothing typed. */
const EMPTY = '[]'

function kept(storage: 'sessionStorage' | 'localStorage'): string[] {
  try {
    return Object.entries(window[storage]).flatMap(([key, text]) => text === EMPTY ? [] : [key])
  }
  catch {
    // Storage may be forbidden: then nothing was kept in it.
    return []
  }
}
