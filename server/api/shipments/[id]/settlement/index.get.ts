import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { settlementAnswer } from '~~/server/utils/settlement/settlementAnswer'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/shipments/{id}/settlement: the four weights of each line, its credit, the statement, disputes and files. */
export default apiRoute({ permission: 'shipments:read', params: idParams }, ({ params }) => settlementAnswer(useDatabase(), params.id, Date.now()))
