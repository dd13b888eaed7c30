import { firmCard } from '../../utils/firm'
import { apiRoute } from '../../utils/http/apiRoute'

/** GET /api/firm/card: whom to ring about a cylinder found; nothing else. */
export default apiRoute({ permission: 'public' }, () => firmCard())
