import { setResponseHeaders } from 'h3'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { useEnvironment } from '~~/server/utils/environment'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { printedLabels } from '~~/server/utils/labels/printedLabels'
import { labelsQuery } from '~~/utils/contract/labels'

/** GET /api/labels.pdf: the labels of codes, ready to print at their exact size. */
export default apiRoute({ permission: 'labels:mint', query: labelsQuery }, async ({ event, query }) => {
  const pdf = await printedLabels(useDatabase(), query, useEnvironment().publicUrl)
  setResponseHeaders(event, { 'Content-Type': 'application/pdf', 'Content-Disposition': 'inline; filename="cylinder-labels.pdf"' })
  return pdf
})
