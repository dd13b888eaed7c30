import { apiRoute } from '../../utils/http/apiRoute'
import { clearSessionCookie } from '../../utils/session/sessionCookie'
import { signOut } from '../../utils/session/signOut'

/** DELETE /api/session: signs out; the sealed cookie is worth nothing from then on. Safe to send twice. */
export default apiRoute({ permission: 'public', status: 204 }, async ({ event }): Promise<null> => {
  await signOut(event, Date.now())
  await clearSessionCookie(event)
  return null
})
