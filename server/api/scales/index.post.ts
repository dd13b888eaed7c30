import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { createScale } from '~~/server/utils/scales/createScale'
import { scaleBody } from '~~/utils/contract/scales'

/** POST /api/scales: a new scale with its accuracy for good. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'scales:manage', body: scaleBody, status: 201 }, ({ body }) =>
  createScale(useDatabase(), body, Date.now()))
