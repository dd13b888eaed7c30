import { kitQuery } from '../../utils/contract/kit'
import { useDatabase } from '../utils/database/currentDatabase'
import { apiRoute } from '../utils/http/apiRoute'
import { squeezed } from '../utils/http/squeezed'
import { kitAnswer } from '../utils/kit/kitAnswer'

/** GET /api/kit: what a phone keeps of the firm and its cylinders, whole at first, then what has changed since it last asked. */
export default apiRoute({ permission: 'fleet:read', query: kitQuery }, async ({ event, query }) => squeezed(event, await kitAnswer(useDatabase(), query)))
