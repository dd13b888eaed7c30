import type { NowFacts } from '../../../utils/now/nowFacts'
import { offersInOrder } from '../../../utils/reclaim/offerOrder'
import { isReached, ourLines } from '../../../utils/reclaim/worth'
import type { Database } from '../database/database'
import { worthLately } from '../reclaim/worth'

/** The best pick-up that reaches a reclaimer's minimum and costs nothing; undefined where there is none. */
export async function worthFacts(db: Database, nowMs: number): Promise<NowFacts['worthPickUp']> {
  const { offers, reclaimers, places } = await worthLately(db, nowMs)
  const takers = reclaimers.flatMap(({ id, name, terms }) => terms ? [{ id, name, terms }] : [])
  const best = offersInOrder(offers, takers, places).find(({ sum }) => isReached(sum) && (sum.comesToCents ?? 0) >= 0)
  if (!best) return undefined
  const names = [...new Set(ourLines(best.offer.lines).map(({ refrigerant }) => refrigerant))]
  return {
    firm: best.firm, place: best.place, refrigerant: names.length === 1 ? names[0]! : null,
    cylinders: best.sum.cylinders, netGrams: best.sum.netGrams, comesToCents: best.sum.comesToCents,
  }
}
