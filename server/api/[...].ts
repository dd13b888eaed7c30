import { apiRoute } from '../utils/http/apiRoute'
import { problem } from '../utils/http/problem'

/** Whatever else is asked under /api is not known. */
export default apiRoute({ permission: 'public' }, () => {
  throw problem(404, 'Not known', 'There is nothing here.')
})
