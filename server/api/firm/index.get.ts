import { ownFirm } from '../../utils/firm'
import { apiRoute } from '../../utils/http/apiRoute'

/** GET /api/firm: the contractor itself. */
export default apiRoute({ permission: 'signed-in' }, () => ownFirm())
