import { apiRoute } from '~~/server/utils/http/apiRoute'
import { refrigerantList } from '~~/server/utils/refrigerants/refrigerants'

/** GET /api/refrigerants: the catalogue, one line each, and the blends of which only the composition is known. */
export default apiRoute({ permission: 'refrigerants:read' }, () => refrigerantList())
