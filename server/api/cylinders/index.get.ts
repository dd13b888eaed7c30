import { getRequestHeader, setResponseHeader, setResponseHeaders } from 'h3'
import { fleetListQuery } from '../../../utils/contract/custody'
import { fleet } from '../../utils/custody/fleet'
import { fleetCsv } from '../../utils/custody/fleetCsv'
import { useDatabase } from '../../utils/database/currentDatabase'
import { apiRoute } from '../../utils/http/apiRoute'

/** GET /api/cylinders: the fleet, filtered, sorted, in pages; with Accept: text/csv the whole list as a table of values. */
export default apiRoute({ permission: 'fleet:read', query: fleetListQuery }, async ({ event, query }) => {
  setResponseHeader(event, 'Vary', 'Accept')
  if (!getRequestHeader(event, 'accept')?.includes('text/csv')) return fleet(useDatabase(), query, Date.now())
  const csv = await fleetCsv(useDatabase(), query, Date.now())
  setResponseHeaders(event, { 'Content-Type': 'text/csv; charset=utf-8; header=present', 'Content-Disposition': 'attachment; filename="fleet.csv"' })
  return csv
})
