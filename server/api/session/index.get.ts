import { apiRoute } from '../../utils/http/apiRoute'
import type { SessionAnswer } from '../../../utils/contract/session'

/** GET /api/session: who is signed in. */
export default apiRoute({ permission: 'signed-in' }, ({ person }): SessionAnswer => ({ user: person }))
