import { keepVerification } from '../../utils/custody/lastVerification'
import { verifyLog } from '../../utils/custody/verify'
import { useDatabase } from '../../utils/database/currentDatabase'
import { apiRoute } from '../../utils/http/apiRoute'

/** GET /api/log/verify: computes every chain again and compares. Changes nothing but when that was last done, and with what result. */
export default apiRoute({ permission: 'log:verify' }, async () => {
  const verification = await verifyLog(useDatabase(), Date.now())
  await keepVerification(useDatabase(), verification)
  return verification
})
