import { problemOf } from '~~/composables/useApi'
import { useKeptForm } from '~~/composables/useKeptForm'
import { usePostingStore, type NewEvent, type Posted } from '~~/stores/posting'

/** One half as its form gives it. */
export type NewHalf = Omit<NewEvent, 'occurredAt'>

/**
 * The form of what happens between two cylinders, kept until both halves are recorded: they go out in one request.
 * Its parts are those of {@link useKeptForm}.
 */
export function usePairForm<Draft extends object>(key: string, empty: () => Draft, supervisorId: () => string) {
  const posting = usePostingStore()
  const { draft, envelope, restored, busy, problem, startOver, recorded, sealedOnce, takesRefusal } = useKeptForm(key, empty, supervisorId)
  const posted = shallowRef<Posted[] | null>(null)

  /** Records both halves; whatever goes wrong, the form stays as it is and says so. */
  async function send(halves: readonly NewHalf[], announcement: string): Promise<void> {
    busy.value = true
    problem.value = null
    try {
      const settled = await posting.postAll(sealedOnce(halves), undefined, takesRefusal)
      // The half that is at fault says why; the other was only held back.
      const refusals = settled.flatMap(each => each.problem ? [each.problem] : [])
      if (refusals.length > 0) problem.value = refusals.find(({ type }) => type !== 'other-half-refused') ?? refusals[0]!
      else {
        posted.value = settled.flatMap(each => each.posted ? [each.posted] : [])
        posting.announceAll(posted.value, announcement)
        recorded()
      }
    }
    catch (error) {
      problem.value = problemOf(error)
    }
    finally {
      busy.value = false
    }
  }

  return { draft, envelope, restored, busy, problem, posted, send, startOver }
}
