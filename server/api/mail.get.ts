import { mailQuery } from '../../utils/contract/mail'
import { apiRoute } from '../utils/http/apiRoute'
import { listMail } from '../utils/mail/mail'

/** GET /api/mail: the letters kept, newest first. */
export default apiRoute({ permission: 'mail:read', query: mailQuery }, ({ query }) => listMail(query))
