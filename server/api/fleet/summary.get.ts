import { fleetSummary } from '../../utils/custody/fleetSummary'
import { useDatabase } from '../../utils/database/currentDatabase'
import { apiRoute } from '../../utils/http/apiRoute'

/** GET /api/fleet/summary: the counts beside the fleet's filters, and what falls due when. */
export default apiRoute({ permission: 'fleet:read' }, () => fleetSummary(useDatabase(), Date.now()))
