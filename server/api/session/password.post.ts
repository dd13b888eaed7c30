import { passwordBody, type SessionAnswer } from '../../../utils/contract/session'
import { apiRoute } from '../../utils/http/apiRoute'
import { changePassword } from '../../utils/session/ownAccount'
import { writeSessionSecret } from '../../utils/session/sessionCookie'

/** POST /api/session/password: changes one's own password; all sessions end and this browser gets a new one. */
export default apiRoute({ permission: 'account:own', body: passwordBody }, async ({ event, person, body }): Promise<SessionAnswer> => {
  await writeSessionSecret(event, await changePassword(person, body.current, body.next, Date.now()))
  return { user: person }
})
