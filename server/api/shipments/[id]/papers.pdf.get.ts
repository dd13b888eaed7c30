import { setResponseHeaders } from 'h3'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { printedPaper } from '~~/server/utils/shipments/printedPapers'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/shipments/{id}/papers.pdf: its bill of lading, as it left or marked as a draft. */
export default apiRoute({ permission: 'shipments:read', params: idParams }, async ({ event, access, params }) => {
  const { name, pdf } = await printedPaper(useDatabase(), params.id, 'bill-of-lading', { access, nowMs: Date.now() })
  setResponseHeaders(event, { 'Content-Type': 'application/pdf', 'Content-Disposition': `inline; filename="${name}"` })
  return pdf
})
