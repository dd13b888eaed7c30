import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { worthToday } from '~~/server/utils/reclaim/worth'

/** GET /api/reclaim/worth: what of the stock each reclaimer would take today, at what price, and what it would refuse. */
export default apiRoute({ permission: 'terms:read' }, () => worthToday(useDatabase(), Date.now()))
