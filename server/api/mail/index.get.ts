import { mailQuery } from '~~/utils/contract/mail'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { listMail } from '~~/server/utils/mail/keptMail'

/** GET /api/mail: the letters kept, newest first. */
export default apiRoute({ permission: 'mail:read', query: mailQuery }, ({ query }) => listMail(query))
