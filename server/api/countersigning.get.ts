import { countersigningQuery } from '~~/utils/contract/countersigning'
import { theCylinder } from '../utils/custody/theCylinder'
import { waitingSignatures } from '../utils/custody/waitingSignatures'
import { useDatabase } from '../utils/database/currentDatabase'
import { apiRoute } from '../utils/http/apiRoute'

/** GET /api/countersigning: what trainees recorded under this person that waits for their signature; nothing for who supervises nobody. Changes nothing. */
export default apiRoute({ permission: 'fleet:read', query: countersigningQuery }, async ({ access, query: { cylinder, ...page } }) => {
  const db = useDatabase()
  return waitingSignatures(db, access.personId, { ...page, ...(cylinder === undefined ? {} : { cylinderId: await theCylinder(db, cylinder) }) })
})
