import { z } from 'zod'
import { pastQuery } from '../../../utils/contract/past'
import { askedPast } from '../../utils/custody/askedPast'
import { fleetSummary } from '../../utils/custody/fleetSummary'
import { pastFleet } from '../../utils/custody/pastFleet'
import { useDatabase } from '../../utils/database/currentDatabase'
import { apiRoute } from '../../utils/http/apiRoute'

const query = z.strictObject(pastQuery)

/** GET /api/fleet/summary: the counts beside the fleet's filters, and what falls due when; with `asOf` and `knownAt` of that instant. */
export default apiRoute({ permission: 'fleet:read', query }, async ({ query }) => {
  const past = askedPast(query, Date.now())
  if (past === null) return fleetSummary(useDatabase(), Date.now())
  const { db, atMs, giveBack } = await pastFleet(useDatabase(), past, true)
  return fleetSummary(db, atMs).finally(giveBack)
})
