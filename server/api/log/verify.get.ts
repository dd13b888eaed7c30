import { Readable } from 'node:stream'
import { getRequestHeader, setResponseHeader } from 'h3'
import { verifyQuery } from '../../../utils/contract/log'
import { useDatabase } from '../../utils/database/currentDatabase'
import { apiRoute } from '../../utils/http/apiRoute'
import { verdictOf } from '../../utils/proof/verifyLog'
import { verifyScope, withProgress } from '../../utils/proof/verifyScope'

/**
 * GET /api/log/verify: computes the log again and compares. Changes nothing but when that was last done, and with what
 * result. With Accept: application/x-ndjson it says how far it has come, line by line, the result in the last.
 */
export default apiRoute({ permission: 'log:verify', query: verifyQuery }, async ({ event, query }) => {
  const steps = verifyScope(useDatabase(), query.scope, Date.now())
  setResponseHeader(event, 'Vary', 'Accept')
  if (!getRequestHeader(event, 'accept')?.includes('application/x-ndjson')) return verdictOf(steps)
  setResponseHeader(event, 'Content-Type', 'application/x-ndjson; charset=utf-8')
  return Readable.from(withProgress(steps), { objectMode: false })
})
