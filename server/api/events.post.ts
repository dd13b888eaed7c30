import { eventsBody, type EventsAnswer } from '../../utils/contract/custody'
import { appendTelling } from '../utils/custody/append'
import { cylinderViews } from '../utils/custody/cylinderViews'
import { cylindersOf } from '../utils/custody/cylindersOf'
import { useDatabase } from '../utils/database/currentDatabase'
import { apiRoute } from '../utils/http/apiRoute'

/**
 * POST /api/events: the one way into the custody log. Each event is answered on its own.
 * Sending a request again is safe: what is recorded is answered `duplicate`.
 */
export default apiRoute({ permission: 'events:post', body: eventsBody }, async ({ access, body }): Promise<EventsAnswer> => {
  const db = useDatabase()
  const now = Date.now()
  const deviceNow = body.deviceNow ? Date.parse(body.deviceNow) : null
  const { results, standing } = await appendTelling(db, { events: body.events, access, now, deviceNow })
  return { results, cylinders: await cylinderViews(db, cylindersOf(body.events, results), { access, nowMs: now }, standing) }
})
