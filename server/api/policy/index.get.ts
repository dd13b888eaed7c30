import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { directory } from '~~/server/utils/directory/directory'
import { policyAnswer } from '~~/server/utils/directory/policyAnswer'
import { apiRoute } from '~~/server/utils/http/apiRoute'

/** GET /api/policy: the firm's dated fill rules, its reminders and its scales. */
export default apiRoute({ permission: 'settings:read' }, async () => policyAnswer(await directory(useDatabase())))
