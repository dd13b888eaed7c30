import { setUpQuery } from '../../utils/contract/setUp'
import { apiRoute } from '../utils/http/apiRoute'
import { setUpLink } from '../utils/setUp/setUp'

/** GET /api/setup?token=: whether the set-up link is still good. */
export default apiRoute({ permission: 'public', query: setUpQuery }, ({ query }) => setUpLink(query.token, Date.now()))
