import { z } from 'zod'
import { apiRoute } from '../utils/http/apiRoute'
import { problem } from '../utils/http/problem'

/** Whatever else is asked under /api is not known. */
export default apiRoute({ permission: 'public', query: z.looseObject({}) }, () => {
  throw problem(404, 'Not known', 'There is nothing here.')
})
