import { apiRoute } from '~~/server/utils/http/apiRoute'
import { refrigerantLines } from '~~/server/utils/refrigerants/refrigerants'
import type { RefrigerantsAnswer } from '~~/utils/contract/refrigerants'

/** GET /api/refrigerants: the catalogue, one line each. */
export default apiRoute({ permission: 'refrigerants:read' }, (): RefrigerantsAnswer => {
  const items = refrigerantLines()
  return { items, nextCursor: null, total: items.length }
})
