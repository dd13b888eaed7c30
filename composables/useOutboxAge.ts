import { useClock } from '~~/composables/useClock'
import { useOutboxStore } from '~~/stores/outbox'

/** How long the oldest entry of this person has been on this device; null where there is none. Units: milliseconds. */
export function useOutboxAge() {
  const outbox = useOutboxStore()
  const now = useClock()
  return computed(() => outbox.oldestAt === null ? null : Math.max(0, now.value - outbox.oldestAt))
}
