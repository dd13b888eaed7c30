import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { changePlace } from '~~/server/utils/places/changePlace'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { idParams } from '~~/utils/contract/parts'
import { placeChange } from '~~/utils/contract/places'

/** PATCH /api/places/{id}: changes what is given and leaves the rest. Safe to send twice. */
export default apiRoute({ permission: 'places:manage', params: idParams, body: placeChange }, ({ params, body }) =>
  changePlace(useDatabase(), params.id, body))
