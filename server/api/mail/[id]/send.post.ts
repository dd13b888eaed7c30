import { idParams } from '~~/utils/contract/parts'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { sendKeptMail } from '~~/server/utils/mail/keptMail'

/** POST /api/mail/{id}/send: sends a letter that was kept inside or could not be sent. One that went out is refused. */
export default apiRoute({ permission: 'mail:send', params: idParams }, async ({ params }) => ({ mail: await sendKeptMail(params.id) }))
