import { personParams } from '../../../../utils/contract/people'
import { apiRoute } from '../../../utils/http/apiRoute'
import { sendInvitation } from '../../../utils/people/invitations'

/** POST /api/people/{id}/invitation: mails a new link to choose a password; the one before it ends. */
export default apiRoute({ permission: 'people:manage', params: personParams }, ({ access, params }) => {
  return sendInvitation(params.id, access, Date.now())
})
