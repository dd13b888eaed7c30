import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { createPlace } from '~~/server/utils/places/createPlace'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { placeBody } from '~~/utils/contract/places'

/** POST /api/places: a new place. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'places:manage', body: placeBody, status: 201 }, ({ body }) =>
  createPlace(useDatabase(), body, Date.now()))
