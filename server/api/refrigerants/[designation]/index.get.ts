import { apiRoute } from '~~/server/utils/http/apiRoute'
import { refrigerantRecord } from '~~/server/utils/refrigerants/refrigerants'
import { designationParams } from '~~/utils/contract/refrigerants'

/** GET /api/refrigerants/{designation}: what is known of one refrigerant or blend, how sure it is, and from where. */
export default apiRoute({ permission: 'refrigerants:read', params: designationParams }, ({ params }) =>
  refrigerantRecord(params.designation))
