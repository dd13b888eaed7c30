import { v7 as uuidv7 } from 'uuid'
import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useDeskFrame } from '~~/composables/useDeskFrame'
import { useNotice } from '~~/composables/useNotice'
import { useSessionStore } from '~~/stores/session'
import type { Permission } from '~~/utils/access/permissions'

/** What is said of one that was turned on again, and of one that was turned off; its name stands before it. */
interface TurnWords { on: string, off: string }

/**
 * The page of people, firms, scales or places: the form that is open, what is sent, and turning one off and on again.
 *
 * Shape: `path` is where the API keeps them; `changed` is called once something was kept. `page` and `form` are handed
 * whole to `DirectoryPage` and to the form in it.
 */
export function useDirectoryPage<Editing extends object>(
  { title, path, manage, turned, changed }: { title: string, path: string, manage: Permission, turned: TurnWords, changed: () => Promise<unknown> },
) {
  const frame = useDeskFrame(title)
  const api = useApi()
  const session = useSessionStore()
  const { busy, problem, attempt } = useAttempt()
  const { toast, say } = useNotice()
  const mayManage = computed(() => session.mayI(manage))
  const editing = shallowRef<Editing | null>(null)
  // Made when the form is opened, so that sending it again makes nothing twice.
  let id = uuidv7()

  function open(next: Editing | null) {
    editing.value = next
    id = uuidv7()
    problem.value = null
  }

  /** Does what answers with the words for it, says them, and has the list fetched anew; `then` comes before the words. */
  async function tell(work: () => Promise<string>, then?: () => void) {
    let said = ''
    if (!await attempt(async () => {
      said = await work()
    })) return
    then?.()
    say(said)
    await changed()
  }

  /** The same for what the open form sends: it is closed once that is kept. */
  function keep(work: () => Promise<string>) {
    return tell(work, () => open(null))
  }

  async function turn(row: { id: string, name: string }, active: boolean) {
    if (!await attempt(() => api.patch(`${path}/${row.id}`, { active }))) return
    say(`${row.name} ${active ? turned.on : turned.off}`, () => turn(row, !active))
    await changed()
  }

  const page = computed(() => ({ mayAdd: mayManage.value, problem: problem.value, editing: editing.value }))
  const form = computed(() => ({ busy: busy.value, errors: problem.value?.errors, onClose: () => open(null) }))

  return { frame, page, form, toast, mayManage, editing, open, newId: () => id, tell, keep, turn }
}
