import { useDeskFrame } from '~~/composables/useDeskFrame'
import type { CylinderList } from '~~/composables/useActedList'
import { useDraftList } from '~~/composables/useDraftList'
import { useNotice } from '~~/composables/useNotice'
import { useSessionStore } from '~~/stores/session'
import type { Permission } from '~~/utils/access/permissions'

/** What the page of a test lot does: it takes scans onto the draft, and cylinders off and back. */
export function useListPage<L extends CylinderList>(kind: 'test-lots', id: string, nameOf: (shown: L | null) => string, prepare: Permission) {
  const session = useSessionStore()
  const list = useDraftList<L>(kind, id)
  const notice = useNotice()
  const shown = computed(() => list.data.value ?? null)
  const name = computed(() => nameOf(shown.value))
  const frame = useDeskFrame(() => name.value, scan)
  const isDraft = computed(() => shown.value?.state === 'draft')
  const mayChange = computed(() => isDraft.value && session.mayI(prepare))
  /** Lines that may not leave as they stand. */
  const heldBack = computed(() => (shown.value?.lines ?? []).filter(line => line.because.length > 0) as L['lines'])

  // A scan goes onto the draft; once it has left, a scan opens the cylinder.
  function scan(code: string) {
    return mayChange.value ? list.add(code) : navigateTo(`/c/${code.toLowerCase()}`)
  }

  /** What both pages hand to `ListSheet`, besides their words. */
  const sheet = computed(() => ({
    title: name.value,
    mayChange: mayChange.value,
    busy: list.busy.value,
    problem: list.actProblem.value,
    changes: list.changes.value,
    onAdd: list.add,
    onGiveUp: list.cancel,
  }))

  async function takeOff(ids: string[]) {
    if (!await list.takeOff(ids)) return
    notice.say(ids.length === 1 ? 'Taken off.' : `${ids.length} taken off.`, () => list.putBack(ids))
  }

  return { list, notice, shown, name, frame, sheet, isDraft, mayChange, heldBack, takeOff }
}
