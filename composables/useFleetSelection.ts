import { useSessionStore } from '~~/stores/session'
import type { Permission } from '~~/utils/access/permissions'
import type { CylinderRow } from '~~/utils/contract/custody'
import type { Place } from '~~/utils/contract/places'
import { selectionOffer, selectionPath, SELECTION_ACTS, stepPath, type SelectionAct } from '~~/utils/fleet/selectionAct'
import { selectionSum } from '~~/utils/fleet/selectionSum'

const PERMISSION: Record<SelectionAct, Permission> = { test: 'lots:prepare', ship: 'shipments:prepare', label: 'labels:mint', move: 'events:post', plan: 'shipments:prepare' }

/** The cylinders chosen in the fleet, over several pages of it: what they come to, and what to do with them. */
export function useFleetSelection(rows: () => readonly CylinderRow[], places: () => readonly Place[]) {
  const session = useSessionStore()
  const picked = ref<string[]>([])
  // Rows that were chosen on another page of the list still count.
  const seen = shallowRef(new Map<string, CylinderRow>())

  const may = computed(() => new Set(SELECTION_ACTS.filter(act => session.mayI(PERMISSION[act]))))
  const chosen = computed(() => picked.value.flatMap(id => seen.value.get(id) ?? []))
  const sum = computed(() => selectionSum(chosen.value))
  const offer = computed(() => selectionOffer(
    chosen.value, may.value, new Set(places().filter(({ kind }) => kind === 'van').map(({ id }) => id)),
  ))

  function act(which: SelectionAct) {
    return navigateTo(selectionPath(which, picked.value))
  }

  function clear() {
    picked.value = []
  }

  watch(rows, (now) => {
    seen.value = new Map([...seen.value, ...now.map(row => [row.id, row] as const)])
  }, { immediate: true })

  return { picked, sum, offer, act, clear, stepLink: (row: CylinderRow) => stepPath(row, may.value) }
}
