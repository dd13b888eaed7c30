import { getRequestHeader } from 'h3'
import { signInBody, type SessionAnswer } from '../../../utils/contract/session'
import { useEnvironment } from '../../utils/environment'
import { apiRoute } from '../../utils/http/apiRoute'
import { callerAddress } from '../../utils/http/callerAddress'
import { readSessionSecret, writeSessionSecret } from '../../utils/session/sessionCookie'
import { signIn } from '../../utils/session/signIn'

/** POST /api/session: signs in with a fresh session. Sent twice it makes two; the one the browser came with ends. */
export default apiRoute({ permission: 'public', body: signInBody }, async ({ event, body }): Promise<SessionAnswer> => {
  const address = callerAddress(event.node.req.socket.remoteAddress, getRequestHeader(event, 'x-forwarded-for'), useEnvironment().proxyHops)
  const replaces = await readSessionSecret(event)
  const { user, sid } = await signIn({ ...body, address, replaces, now: Date.now() })
  await writeSessionSecret(event, sid)
  return { user }
})
