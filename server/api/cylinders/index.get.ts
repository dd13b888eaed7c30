import { fleetQuery } from '../../../utils/contract/custody'
import { fleet } from '../../utils/custody/fleet'
import { useDatabase } from '../../utils/database/currentDatabase'
import { apiRoute } from '../../utils/http/apiRoute'

/** GET /api/cylinders: the fleet, filtered, sorted, in pages. */
export default apiRoute({ permission: 'fleet:read', query: fleetQuery }, ({ query }) => fleet(useDatabase(), query, Date.now()))
