import type { DockBox, KeptDockPhoto } from '~~/composables/dockBox'
import { problemOf } from '~~/composables/useApi'
import type { DockAnswer, DockEntriesAnswer } from '~~/utils/contract/dock'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { DockEntry } from '~~/utils/dock/entry'

/** How a sending ended: nothing waits, the server was not reached, or the link opens nothing any more. */
export type DockSent = 'done' | 'unreached' | 'ended'

/** How the server is asked, and who is told of the shipment as it then stands. */
export interface DockWay {
  post: (entries: DockEntry[]) => Promise<DockEntriesAnswer>
  postPhoto: (photo: KeptDockPhoto) => Promise<unknown>
  answered: (dock: DockAnswer) => unknown
}

const AT_ONCE = 50
/** Answers that the same request would only meet again. */
const FINAL: ReadonlySet<number> = new Set([400, 409, 413, 415, 422])

/**
 * Sends what a phone keeps of a shipment, in the order in which it was made, and then the photos. Only a verdict on an
 * entry itself takes it out; what breaks off is sent again, and recorded once.
 */
export async function sendDock(box: DockBox, shipmentId: string, way: DockWay): Promise<DockSent> {
  const entries = await sendEntries(box, shipmentId, way)
  return entries === 'done' ? sendPhotos(box, shipmentId, way) : entries
}

/** Whether the server says of a link that it opens nothing; another's page, or a page of another, says nothing of it. */
export function opensNothing({ type, status }: ProblemDetails): boolean {
  return status === 404 && type === 'link-unknown'
}

async function sendEntries(box: DockBox, shipmentId: string, { post, answered }: DockWay): Promise<DockSent> {
  let atOnce = AT_ONCE
  for (;;) {
    const going = (await box.entries(shipmentId)).filter(({ problem }) => problem === null).slice(0, atOnce)
    if (going.length === 0) return 'done'
    try {
      const { results, dock } = await post(going.map(({ entry }) => entry))
      // A network that wants its guests to sign in answers with a page of its own.
      if (!Array.isArray(results) || !going.every(({ id }) => results.some(result => result.id === id))) return 'unreached'
      await box.settle(results)
      await answered(dock)
    }
    catch (error) {
      const problem = problemOf(error)
      if (opensNothing(problem)) return 'ended'
      if (!FINAL.has(problem.status)) return 'unreached'
      // One of them does not fit: alone, the others go through.
      if (going.length === 1) await box.settle([{ id: going[0]!.id, outcome: 'refused', problem }])
      atOnce = 1
    }
  }
}

async function sendPhotos(box: DockBox, shipmentId: string, { postPhoto }: DockWay): Promise<DockSent> {
  const refused = new Set((await box.entries(shipmentId)).map(({ id }) => id))
  for (const photo of await box.photos(shipmentId)) {
    if (photo.problem !== null || refused.has(photo.entryId)) continue
    try {
      await postPhoto(photo)
      await box.removePhoto(photo.id)
    }
    catch (error) {
      const problem = problemOf(error)
      if (opensNothing(problem)) return 'ended'
      if (!FINAL.has(problem.status)) return 'unreached'
      await box.putPhoto({ ...photo, problem })
    }
  }
  return 'done'
}
