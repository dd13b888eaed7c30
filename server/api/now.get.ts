import { nowQuery } from '~~/utils/contract/now'
import { useDatabase } from '../utils/database/currentDatabase'
import { apiRoute } from '../utils/http/apiRoute'
import { nowAnswer } from '../utils/now/now'

/** GET /api/now: what waits for this person by their roles, each with the act that clears it. Changes nothing. */
export default apiRoute({ permission: 'fleet:read', query: nowQuery }, ({ access, person, query }) =>
  nowAnswer(useDatabase(), access, query.unit ?? person.units, Date.now()))
