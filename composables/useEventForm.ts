import { problemOf } from '~~/composables/useApi'
import type { KeptOn } from '~~/composables/useKept'
import { useKeptForm } from '~~/composables/useKeptForm'
import { usePostingStore, type NewEvent, type Posted } from '~~/stores/posting'

/** The form of one event, kept until it is recorded; its parts are those of {@link useKeptForm}. */
export function useEventForm<Draft extends object>(key: string, empty: () => Draft, supervisorId: () => string = () => '', keptOn: KeptOn = 'tab') {
  const posting = usePostingStore()
  const { draft, envelope, restored, endedElsewhere, busy, problem, startOver, recorded, sealedOnce, takePlaceOf, takesRefusal } = useKeptForm(key, empty, supervisorId, keptOn)
  const posted = shallowRef<Posted | null>(null)

  /** Records what the form says; whatever goes wrong, the form stays as it is and says so. */
  async function send(content: Omit<NewEvent, 'occurredAt'>): Promise<Posted | null> {
    busy.value = true
    problem.value = null
    const [event] = sealedOnce([content])
    try {
      posted.value = await posting.post(event!, takesRefusal)
      posting.announce(posted.value)
      recorded()
      return posted.value
    }
    catch (error) {
      problem.value = problemOf(error)
      return null
    }
    finally {
      busy.value = false
    }
  }

  return { draft, envelope, restored, endedElsewhere, busy, problem, posted, send, startOver, takePlaceOf }
}
