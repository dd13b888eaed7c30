import { useApi } from '~~/composables/useApi'
import { useAttempt } from '~~/composables/useAttempt'
import { useEventIds } from '~~/composables/useEventIds'
import { useLoaded } from '~~/composables/useLoaded'
import type { PapersAnswer, PapersMailAnswer } from '~~/utils/contract/papers'
import type { Classification } from '~~/utils/transport/shipperEntries'

/** What a shipment's papers say, the shipper's word on its lines, and the mailing of them. */
export function useShipmentPapers(shipmentId: string) {
  const api = useApi()
  const path = `/api/shipments/${shipmentId}`
  const papers = useLoaded(`${path}/papers`, () => api.get<PapersAnswer>(`${path}/papers`))
  const idOf = useEventIds()
  const { busy, problem, attempt } = useAttempt()
  /** Acts done so far: what is said a second time is another act, what is sent again for want of an answer is the same. */
  let acts = 0

  async function classify(cylinderId: string, classification: Classification | null): Promise<boolean> {
    return attempt(async () => {
      const about = `${acts} ${cylinderId} ${JSON.stringify(classification)}`
      papers.data.value = await api.put<PapersAnswer>(`${path}/lines/${cylinderId}/classification`, { id: idOf(about), occurredAt: new Date().toISOString(), classification })
      acts++
    })
  }

  /** What became of the letter; null where it was refused. */
  async function mail(letter: { to?: string, note?: string }): Promise<PapersMailAnswer | null> {
    let answer: PapersMailAnswer | null = null
    await attempt(async () => {
      answer = await api.post<PapersMailAnswer>(`${path}/papers/mail`, { id: idOf(`${acts} mail ${JSON.stringify(letter)}`), occurredAt: new Date().toISOString(), ...letter })
      acts++
    })
    return answer
  }

  return { ...papers, busy, attemptProblem: problem, classify, mail }
}
