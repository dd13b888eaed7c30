import { invitationParams, takeUpBody } from '../../../../utils/contract/people'
import type { SessionAnswer } from '../../../../utils/contract/session'
import { apiRoute } from '../../../utils/http/apiRoute'
import { takeUpInvitation } from '../../../utils/people/invitations'
import { writeSessionSecret } from '../../../utils/session/sessionCookie'

/** POST /api/invitations/{token}: chooses the password and signs in. Once: afterwards 404. */
export default apiRoute({ permission: 'public', params: invitationParams, body: takeUpBody }, async ({ event, params, body }): Promise<SessionAnswer> => {
  const { user, sid } = await takeUpInvitation(params.token, body.password, Date.now())
  await writeSessionSecret(event, sid)
  return { user }
})
