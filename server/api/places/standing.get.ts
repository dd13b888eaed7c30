import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { standingByPlace } from '~~/server/utils/places/standing'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import type { StandingAnswer } from '~~/utils/contract/places'

/** GET /api/places/standing: what stands in each place, without what stands in the places inside it. */
export default apiRoute({ permission: 'places:read' }, async (): Promise<StandingAnswer> => ({ items: await standingByPlace(useDatabase()) }))
