import { eventsBody, type EventsAnswer } from '../../utils/contract/custody'
import { NOT_ITS_AUTHOR } from '../../utils/outbox/notItsAuthor'
import { appendTelling } from '../utils/custody/append'
import { cylinderViews } from '../utils/custody/cylinderViews'
import { cylindersOf } from '../utils/custody/cylindersOf'
import { useDatabase } from '../utils/database/currentDatabase'
import { apiRoute } from '../utils/http/apiRoute'
import { problem } from '../utils/http/problem'

/**
 * POST /api/events: the one way into the custody log. Each event is answered on its own.
 * Sending a request again is safe: what is recorded is answered `duplicate`.
 */
export default apiRoute({ permission: 'events:post', body: eventsBody }, async ({ access, body }): Promise<EventsAnswer> => {
  if (body.author !== undefined && body.author !== access.personId) {
    throw problem(403, 'Somebody else is signed in', 'These entries wait until their author signs in.', undefined, { type: NOT_ITS_AUTHOR })
  }
  const db = useDatabase()
  const now = Date.now()
  const deviceNow = body.deviceNow ? Date.parse(body.deviceNow) : null
  const { results, standing } = await appendTelling(db, { events: body.events, access, now, deviceNow })
  const cylinders = await cylinderViews(db, cylindersOf(body.events, results), { access, nowMs: now }, standing).catch(notDrawn)
  return { results, cylinders }
})

/** What was recorded is answered, though a cylinder could not be drawn: else a phone would send it again and again. */
function notDrawn(error: unknown): EventsAnswer['cylinders'] {
  console.error('recorded, but the cylinders were not drawn', { error: String(error) })
  return []
}
