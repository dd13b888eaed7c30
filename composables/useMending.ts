import { deviceNow } from '~~/composables/deviceNow'
import type { Envelope } from '~~/composables/useKeptForm'
import { useOutboxStore } from '~~/stores/outbox'
import type { CustodyEvent } from '~~/utils/custody/event'
import type { OutboxEntry } from '~~/utils/outbox/entry'

/**
 * A form opened on a refused entry of this device, which what is recorded then takes the place of.
 *
 * Shape: `id` is the entry's, null where the form begins afresh; `photoIds` are the pictures that go with it; `begin` is
 * called with the entry once the form stands, unless what was typed into it was kept from before; `takePlaceOf` where
 * the event may go once more as the same one.
 */
export function useMending(
  restored: () => boolean, begin: (entry: OutboxEntry, envelope: Envelope) => void, takePlaceOf: (event: CustodyEvent) => void,
) {
  const outbox = useOutboxStore()
  const id = mendedId()
  const photoIds = ref<string[]>([])

  onMounted(async () => {
    if (id === null) return
    await outbox.read()
    const entry = outbox.refused.find(each => each.id === id)
    if (!entry) return
    const { occurredAt, supervisorId = '', note = '' } = entry.event
    photoIds.value = entry.event.photoIds ?? []
    // The log may have another event by its id: then it goes as a new one.
    if (entry.problem?.status !== 409) takePlaceOf(entry.event)
    if (!restored()) begin(entry, { at: deviceNow(Date.parse(occurredAt)).slice(0, 19), supervisorId, note })
  })

  return { id, photoIds, done: async () => id === null ? undefined : outbox.giveBack([id]) }
}

/** The entry that the page's address asks to mend. */
export function mendedId(): string | null {
  const { mend } = useRoute().query
  return typeof mend === 'string' ? mend : null
}
