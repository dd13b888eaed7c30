import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { mailPapers } from '~~/server/utils/shipments/mailPapers'
import { papersMailBody } from '~~/utils/contract/papers'
import { idParams } from '~~/utils/contract/parts'

/** POST /api/shipments/{id}/papers/mail: its papers to the reclaimer, or to another address. Sent again under the same id, they go out once. */
export default apiRoute({ permission: 'shipments:dispatch', params: idParams, body: papersMailBody }, ({ access, params, body }) =>
  mailPapers(useDatabase(), params.id, body, { access, nowMs: Date.now() }))
