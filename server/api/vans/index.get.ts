import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { listVans } from '~~/server/utils/vans/vans'
import type { VansAnswer } from '~~/utils/contract/vans'

/** GET /api/vans: every van in use, with its load and what is to be looked for. */
export default apiRoute({ permission: 'fleet:read' }, async (): Promise<VansAnswer> => ({ items: await listVans(useDatabase(), Date.now()) }))
