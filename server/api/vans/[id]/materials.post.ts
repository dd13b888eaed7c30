import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { sayMaterials } from '~~/server/utils/vans/materials'
import { theVan, vanAnswer } from '~~/server/utils/vans/vans'
import { idParams } from '~~/utils/contract/parts'
import { vanMaterialsBody } from '~~/utils/contract/vans'

/** POST /api/vans/{id}/materials: says what the van carries beside cylinders, in place of what was said before. Sent twice under one id it is kept once. */
export default apiRoute({ permission: 'events:post', params: idParams, body: vanMaterialsBody, status: 201 }, async ({ access, params, body }) => {
  const db = useDatabase()
  await theVan(db, params.id)
  await sayMaterials(db, params.id, body, access.personId, Date.now())
  return vanAnswer(db, params.id, Date.now())
})
