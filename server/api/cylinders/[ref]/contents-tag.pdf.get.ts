import { setResponseHeaders } from 'h3'
import { contentsTagQuery } from '../../../../utils/contract/labels'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { useEnvironment } from '../../../utils/environment'
import { apiRoute } from '../../../utils/http/apiRoute'
import { printedContentsTag } from '../../../utils/labels/contentsTag'

/** GET /api/cylinders/{ref}/contents-tag.pdf: the tag of its present contents, ready to print at its exact size. */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams, query: contentsTagQuery }, async ({ event, access, params, query }) => {
  const db = useDatabase()
  const asking = { access, nowMs: Date.now(), publicUrl: useEnvironment().publicUrl }
  const pdf = await printedContentsTag(db, await theCylinder(db, params.ref), query, asking)
  setResponseHeaders(event, { 'Content-Type': 'application/pdf', 'Content-Disposition': 'inline; filename="contents-tag.pdf"' })
  return pdf
})
