import { setUpBody } from '../../utils/contract/setUp'
import type { SessionAnswer } from '../../utils/contract/session'
import { apiRoute } from '../utils/http/apiRoute'
import { writeSessionSecret } from '../utils/session/sessionCookie'
import { setUp } from '../utils/setUp/setUp'

/** POST /api/setup: makes the firm and its first admin, and signs in. Once: afterwards 404. */
export default apiRoute({ permission: 'public', body: setUpBody, status: 201 }, async ({ event, body }): Promise<SessionAnswer> => {
  const { user, sid } = await setUp(body, Date.now())
  await writeSessionSecret(event, sid)
  return { user }
})
