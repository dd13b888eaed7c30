import { setResponseStatus } from 'h3'
import type { Health } from '../../utils/contract/firm'
import { health } from '../utils/health'
import { apiRoute } from '../utils/http/apiRoute'

/** GET /api/health: whether the server can answer; 503 when its database cannot. */
export default apiRoute({ permission: 'public' }, async ({ event }): Promise<Health> => {
  const answer = await health()
  if (!answer.ok) setResponseStatus(event, 503)
  return answer
})
