import { useDatabase } from '../../utils/database/currentDatabase'
import { verifyLog } from '../../utils/custody/verify'
import { apiRoute } from '../../utils/http/apiRoute'

/** GET /api/log/verify: computes every chain again and compares. Changes nothing. */
export default apiRoute({ permission: 'log:verify' }, () => verifyLog(useDatabase(), Date.now()))
