import { setResponseHeaders } from 'h3'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'
import { printedOwnerNotice } from '../../../utils/notices/ownerNotice'

/** GET /api/cylinders/{ref}/notice.pdf: the notice to the owner of a rejected or condemned cylinder. Changes nothing. */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams }, async ({ event, access, params }) => {
  const db = useDatabase()
  const pdf = await printedOwnerNotice(db, await theCylinder(db, params.ref), { access, nowMs: Date.now() })
  setResponseHeaders(event, { 'Content-Type': 'application/pdf', 'Content-Disposition': 'inline; filename="notice-to-the-owner.pdf"' })
  return pdf
})
