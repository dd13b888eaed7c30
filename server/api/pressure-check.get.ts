import { apiRoute } from '~~/server/utils/http/apiRoute'
import { pressureCheckAnswer } from '~~/server/utils/refrigerants/pressureCheckAnswer'
import { pressureCheckQuery } from '~~/utils/contract/pressureCheck'

/** GET /api/pressure-check: a cylinder's pressure against the dew to bubble band of a refrigerant, without a cylinder. */
export default apiRoute({ permission: 'refrigerants:read', query: pressureCheckQuery }, ({ query }) => pressureCheckAnswer(query))
