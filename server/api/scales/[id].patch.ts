import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { changeScale } from '~~/server/utils/scales/changeScale'
import { idParams } from '~~/utils/contract/parts'
import { scaleChange } from '~~/utils/contract/scales'

/** PATCH /api/scales/{id}: name, last check, on or off; never its accuracy. Safe to send twice. */
export default apiRoute({ permission: 'scales:manage', params: idParams, body: scaleChange }, ({ params, body }) =>
  changeScale(useDatabase(), params.id, body, Date.now()))
