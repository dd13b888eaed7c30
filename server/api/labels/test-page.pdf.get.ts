import { setResponseHeaders } from 'h3'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { labelFonts } from '~~/server/utils/pdf/fonts'
import { labelSheetPdf } from '~~/server/utils/pdf/labelSheetPdf'
import { printerOf, testPageQuery } from '~~/utils/contract/labels'
import { LABEL_STOCKS } from '~~/utils/label/stock'
import { testPage } from '~~/utils/label/testPage'

/** GET /api/labels/test-page.pdf: rulers and frames for a stock, to see whether the printer scales or prints beside. */
export default apiRoute({ permission: 'labels:mint', query: testPageQuery }, async ({ event, query }) => {
  const pdf = await labelSheetPdf(testPage(LABEL_STOCKS[query.stock], printerOf(query)), await labelFonts())
  setResponseHeaders(event, { 'Content-Type': 'application/pdf', 'Content-Disposition': 'inline; filename="label-test-page.pdf"' })
  return pdf
})
