import { getRequestHeader, setResponseHeader, setResponseHeaders } from 'h3'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { massBalance } from '~~/server/utils/records/massBalance'
import { massBalanceCsv } from '~~/server/utils/records/massBalanceCsv'
import { massBalanceQuery } from '~~/utils/contract/massBalance'

/** GET /api/reports/mass-balance: the balance of each refrigerant over a period; with Accept: text/csv an owner's account a line. */
export default apiRoute({ permission: 'reports:read', query: massBalanceQuery }, async ({ event, query }) => {
  setResponseHeader(event, 'Vary', 'Accept')
  const answer = await massBalance(useDatabase(), query, Date.now())
  if (!getRequestHeader(event, 'accept')?.includes('text/csv')) return answer
  setResponseHeaders(event, { 'Content-Type': 'text/csv; charset=utf-8; header=present', 'Content-Disposition': 'attachment; filename="mass-balance.csv"' })
  return massBalanceCsv(answer)
})
