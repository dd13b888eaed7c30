import type { RouteLocationRaw } from 'vue-router'
import { useDeskFrame } from '~~/composables/useDeskFrame'
import { useSessionStore } from '~~/stores/session'
import { worksAtDesk } from '~~/utils/access/navigation'

/**
 * The frame of a page that desk and field share: at the desk its navigation, in the field the page's title and a way back.
 *
 * Handed to the layout whole: `<NuxtLayout v-bind="frame">`. At the desk the page writes its heading itself (`isDesk`).
 */
export function useRoleFrame(title: string | (() => string), back?: () => RouteLocationRaw | null) {
  const session = useSessionStore()
  const isDesk = computed(() => worksAtDesk(session.access))
  const desk = useDeskFrame(title)
  const frame = computed(() => isDesk.value
    ? { name: 'desk' as const, ...desk.value }
    : { name: 'field' as const, title: typeof title === 'function' ? title() : title, back: back?.() ?? null, wide: true })
  return { frame, isDesk }
}
