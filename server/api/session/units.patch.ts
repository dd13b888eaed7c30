import { unitsBody, type SessionAnswer } from '../../../utils/contract/session'
import { apiRoute } from '../../utils/http/apiRoute'
import { changeUnits } from '../../utils/session/ownAccount'

/** PATCH /api/session/units: the units one reads weights in. */
export default apiRoute({ permission: 'account:own', body: unitsBody }, async ({ person, body }): Promise<SessionAnswer> => {
  return { user: await changeUnits(person, body.units) }
})
