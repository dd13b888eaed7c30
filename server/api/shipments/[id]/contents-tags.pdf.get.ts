import { setResponseHeaders } from 'h3'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { useEnvironment } from '~~/server/utils/environment'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { printedTags } from '~~/server/utils/shipments/printedTags'
import { contentsTagQuery } from '~~/utils/contract/labels'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/shipments/{id}/contents-tags.pdf: the tags of its cylinders, ready to print at their exact size. */
export default apiRoute({ permission: 'shipments:read', params: idParams, query: contentsTagQuery }, async ({ event, access, params, query }) => {
  const pdf = await printedTags(useDatabase(), params.id, query, { access, nowMs: Date.now(), publicUrl: useEnvironment().publicUrl })
  setResponseHeaders(event, { 'Content-Type': 'application/pdf', 'Content-Disposition': 'inline; filename="contents-tags.pdf"' })
  return pdf
})
