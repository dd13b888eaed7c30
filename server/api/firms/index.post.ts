import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { createFirm } from '~~/server/utils/firms/createFirm'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { firmBody } from '~~/utils/contract/places'

/** POST /api/firms: a new firm and its place. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'firms:manage', body: firmBody, status: 201 }, ({ body }) =>
  createFirm(useDatabase(), body, Date.now()))
