import { v7 as uuidv7 } from 'uuid'
import { ApiError, problemOf, useApi } from '~~/composables/useApi'
import { deviceNow, usePostingStore } from '~~/stores/posting'
import type { Stamp } from '~~/utils/capacity/types'
import type { MintAnswer } from '~~/utils/contract/labels'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CustodyEvent } from '~~/utils/custody/event'
import type { RegistrationDetails } from '~~/utils/registration/draft'

/** A cylinder that was registered; `labelProblem` says why its label was not recorded with it, `isQueued` that both wait to be sent. */
export interface Registered { isQueued: boolean, id: string, code: string | null, stamp: Stamp, labelProblem: ProblemDetails | null }

type Label = { choice: 'new' } | { choice: 'blank', code: string } | { choice: 'later' }

/** Records a cylinder and its label in one request; sent again after a lost answer it records nothing twice. */
export function useRegistration() {
  const api = useApi()
  const posting = usePostingStore()
  const busy = ref(false)
  const problem = ref<ProblemDetails | null>(null)
  let sealed: { key: string, events: CustodyEvent[], code: string | null } | null = null

  async function seal(details: RegistrationDetails, placeId: string, label: Label, photoIds: string[]) {
    const code = label.choice === 'new'
      ? (await api.post<MintAnswer>('/api/labels', { count: 1 })).codes[0]!
      : label.choice === 'blank' ? label.code : null
    const common = { cylinderId: uuidv7(), occurredAt: deviceNow(), placeId }
    const events: CustodyEvent[] = [posting.seal<'registered'>({ ...common, kind: 'registered', ...(photoIds.length > 0 && { photoIds }), details }) as CustodyEvent]
    if (code !== null) events.push(posting.seal<'labelled'>({ ...common, kind: 'labelled', details: { code } }) as CustodyEvent)
    return { key: JSON.stringify([details, placeId, label, photoIds]), events, code }
  }

  async function register(details: RegistrationDetails, placeId: string, label: Label, photoIds: string[]): Promise<Registered | null> {
    busy.value = true
    problem.value = null
    try {
      const key = JSON.stringify([details, placeId, label, photoIds])
      if (sealed?.key !== key) sealed = await seal(details, placeId, label, photoIds)
      const { events, code } = sealed
      const [registration, labelling] = await posting.postAll(events)
      if (registration!.problem) throw new ApiError(registration!.problem)
      sealed = null
      const labelProblem = labelling?.problem ?? null
      return { isQueued: registration!.posted?.isQueued === true, id: events[0]!.cylinderId, code: labelProblem ? null : code, stamp: details.stamp, labelProblem }
    }
    catch (error) {
      problem.value = problemOf(error)
      // A refused event is mended and sent as a new one; a lost answer is asked for again with the same.
      if (problem.value.status !== 0 && problem.value.status < 500) sealed = null
      return null
    }
    finally {
      busy.value = false
    }
  }

  return { register, busy, problem }
}
