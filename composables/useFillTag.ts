import { useApi } from '~~/composables/useApi'
import { useFirmRulesStore } from '~~/stores/firmRules'
import type { Posted } from '~~/stores/posting'
import { useSessionStore } from '~~/stores/session'
import { noTagBecause, tagDay, tagOfFill, type ContentsTag, type ContentsTagAnswer } from '~~/utils/document/contentsTag'

/** What the tag of a fill that was just recorded says: as the server has it, else worked out on this device; null where it gets none. */
export function useFillTag(posted: () => Posted | null) {
  const api = useApi()
  const session = useSessionStore()
  const rules = useFirmRulesStore()
  const tag = shallowRef<{ tag: ContentsTag, day: string } | null>(null)

  watch(posted, async (done) => {
    tag.value = null
    const view = done?.cylinder
    if (!done || !view || noTagBecause(view) !== null) return
    const answer = await api.get<ContentsTagAnswer>(`/api/cylinders/${view.id}/contents-tag`).catch(() => null)
    tag.value = answer?.tag ? answer : await workedOut(done)
  })

  async function workedOut({ event, cylinder: view }: Posted): Promise<{ tag: ContentsTag, day: string }> {
    const [{ CATALOGUE }, { tagEntry }] = await Promise.all([
      import('~~/utils/refrigerant/allRefrigerants'),
      import('~~/utils/document/tagEntry'),
    ])
    const putIn = { kind: event.kind, on: event.occurredAt, technician: session.user?.name ?? '' }
    const entry = tagEntry(view!.contents.refrigerant ?? '', CATALOGUE)
    return { tag: tagOfFill(view!, putIn, entry), day: tagDay(Date.parse(event.occurredAt), rules.timeZone) }
  }

  return tag
}
