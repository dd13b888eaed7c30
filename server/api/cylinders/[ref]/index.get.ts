import { z } from 'zod'
import { pastQuery } from '../../../../utils/contract/past'
import { askedPast } from '../../../utils/custody/askedPast'
import { cylinderView } from '../../../utils/custody/cylinderViews'
import { pastCylinder } from '../../../utils/custody/pastCylinder'
import { cylinderParams, theCylinder } from '../../../utils/custody/theCylinder'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'

const query = z.strictObject({ refrigerant: z.string().min(1).max(40).optional(), ...pastQuery })

/**
 * GET /api/cylinders/{ref}: everything that is to be said of one cylinder today, or with `asOf` and `knownAt` as it stood
 * and was known then; `refrigerant` asks about one to come.
 */
export default apiRoute({ permission: 'fleet:read', params: cylinderParams, query }, async ({ access, params, query }) => {
  const db = useDatabase()
  const nowMs = Date.now()
  const past = askedPast(query, nowMs)
  const id = await theCylinder(db, params.ref)
  return past === null ? cylinderView(db, id, { access, nowMs, askedRefrigerant: query.refrigerant }) : pastCylinder(db, id, past, query.refrigerant)
})
