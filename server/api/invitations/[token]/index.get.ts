import { invitationParams } from '../../../../utils/contract/people'
import { apiRoute } from '../../../utils/http/apiRoute'
import { invitationOf } from '../../../utils/people/invitations'

/** GET /api/invitations/{token}: whose invitation it is. */
export default apiRoute({ permission: 'public', params: invitationParams }, ({ params }) => invitationOf(params.token, Date.now()))
