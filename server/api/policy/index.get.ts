import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { directory } from '~~/server/utils/directory/directory'
import { policyAnswer } from '~~/server/utils/directory/policyAnswer'
import { rowsBehind } from '~~/server/utils/custody/rowsByRule'
import { apiRoute } from '~~/server/utils/http/apiRoute'

/** GET /api/policy: the firm's dated rules with their reasons, its reminders and its scales. */
export default apiRoute({ permission: 'settings:read' }, async () => {
  const db = useDatabase()
  const now = Date.now()
  return policyAnswer(await directory(db), now, await rowsBehind(db, now))
})
