import { z } from 'zod'
import { pastQuery, type PastProgress } from '../../../utils/contract/past'
import { askedPast } from '../../utils/custody/askedPast'
import { pastProgress } from '../../utils/custody/pastFleet'
import { useDatabase } from '../../utils/database/currentDatabase'
import { apiRoute } from '../../utils/http/apiRoute'
import { impossible } from '../../utils/http/impossible'

const query = z.strictObject(pastQuery)

/** GET /api/fleet/as-it-stood: how far the fleet of a past instant is made, for whoever waits for its list. Changes nothing. */
export default apiRoute({ permission: 'fleet:read', query }, ({ query }): PastProgress => {
  const past = askedPast(query, Date.now())
  if (past === null) throw impossible('asOf', 'must be given, or knownAt')
  return pastProgress(useDatabase(), past)
})
