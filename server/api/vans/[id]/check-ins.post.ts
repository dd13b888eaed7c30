import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { keepCheckIn } from '~~/server/utils/vans/checkIns'
import { theVan, vanAnswer } from '~~/server/utils/vans/vans'
import { idParams } from '~~/utils/contract/parts'
import { vanCheckInBody } from '~~/utils/contract/vans'

/** POST /api/vans/{id}/check-ins: keeps what came back and what did not; the cylinders themselves move by events. Sent twice under one id it is kept once. */
export default apiRoute({ permission: 'events:post', params: idParams, body: vanCheckInBody, status: 201 }, async ({ access, params, body }) => {
  const db = useDatabase()
  await theVan(db, params.id)
  await keepCheckIn(db, params.id, body, access.personId, Date.now())
  return vanAnswer(db, params.id, Date.now())
})
