import { logHead } from '../../utils/custody/logHead'
import { useDatabase } from '../../utils/database/currentDatabase'
import { apiRoute } from '../../utils/http/apiRoute'

/** GET /api/log/head: how far the custody log has come. */
export default apiRoute({ permission: 'fleet:read' }, () => logHead(useDatabase()))
