import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { listPlaces } from '~~/server/utils/places/places'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { placesQuery, type PlacesAnswer } from '~~/utils/contract/places'

/** GET /api/places: the whole list, by name. */
export default apiRoute({ permission: 'places:read', query: placesQuery }, async ({ query }): Promise<PlacesAnswer> => {
  const active = query.active === undefined ? undefined : query.active === 'true'
  const items = await listPlaces(useDatabase(), { active })
  return { items, nextCursor: null, total: items.length }
})
