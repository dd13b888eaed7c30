import type { Firm } from '~~/utils/contract/places'
import type { Database } from '../database/database'
import { firmById } from '../firms/firms'
import { problem } from '../http/problem'

/** A firm that takes refrigerant back. Errors: 404 where there is no such firm; 422 where it is something else. */
export async function theReclaimer(db: Database, id: string): Promise<Firm> {
  const firm = await firmById(db, id)
  if (!firm) throw problem(404, 'No such firm', 'It may have been written wrongly.')
  if (firm.kind !== 'reclaimer') throw problem(422, 'Not a reclaimer', `${firm.name} takes no refrigerant back; only a reclaimer has terms and prices.`)
  return firm
}
