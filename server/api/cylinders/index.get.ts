import { getRequestHeader, setResponseHeader, setResponseHeaders } from 'h3'
import { fleetListQuery } from '../../../utils/contract/custody'
import { endWithAnswer } from '../../utils/csv/endWithAnswer'
import { askedPast } from '../../utils/custody/askedPast'
import { fleet } from '../../utils/custody/fleet'
import { onTheirLists } from '../../utils/cylinder-lists/openLists'
import { fleetCsv } from '../../utils/custody/fleetCsv'
import { pastFleet } from '../../utils/custody/pastFleet'
import { useDatabase } from '../../utils/database/currentDatabase'
import { apiRoute } from '../../utils/http/apiRoute'

/**
 * GET /api/cylinders: the fleet, filtered, sorted, in pages, or with `asOf` and `knownAt` as it stood and was known then;
 * with Accept: text/csv the whole list as a table of values.
 */
export default apiRoute({ permission: 'fleet:read', query: fleetListQuery }, async ({ event, query }) => {
  setResponseHeader(event, 'Vary', 'Accept')
  const nowMs = Date.now()
  const past = askedPast(query, nowMs)
  const { db, atMs, giveBack } = past === null
    ? { db: useDatabase(), atMs: nowMs, giveBack: () => undefined }
    : await pastFleet(useDatabase(), past, query.cursor !== undefined)
  let isStreaming = false
  try {
    if (!getRequestHeader(event, 'accept')?.includes('text/csv')) {
      const answer = await fleet(db, query, atMs)
      return past === null ? { ...answer, items: await onTheirLists(db, answer.items) } : answer
    }
    const csv = await fleetCsv(db, query, atMs)
    isStreaming = true
    csv.once('close', giveBack)
    endWithAnswer(event, csv)
    setResponseHeaders(event, { 'Content-Type': 'text/csv; charset=utf-8; header=present', 'Content-Disposition': 'attachment; filename="fleet.csv"' })
    return csv
  }
  finally {
    if (!isStreaming) giveBack()
  }
})
