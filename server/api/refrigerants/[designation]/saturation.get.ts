import { apiRoute } from '~~/server/utils/http/apiRoute'
import { saturationOf } from '~~/server/utils/refrigerants/refrigerants'
import { designationParams, saturationQuery } from '~~/utils/contract/refrigerants'

/** GET /api/refrigerants/{designation}/saturation?temperatureC= : densities and pressures, with their source. */
export default apiRoute({ permission: 'refrigerants:read', params: designationParams, query: saturationQuery }, ({ params, query }) =>
  saturationOf(params.designation, query.temperatureC))
