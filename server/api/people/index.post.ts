import { inviteBody } from '../../../utils/contract/people'
import { apiRoute } from '../../utils/http/apiRoute'
import { invite } from '../../utils/people/invitations'

/** POST /api/people: makes a person and mails the invitation. Sent twice: 409, the address is taken. */
export default apiRoute({ permission: 'people:manage', body: inviteBody, status: 201 }, ({ access, body }) => {
  return invite(body, access, Date.now())
})
