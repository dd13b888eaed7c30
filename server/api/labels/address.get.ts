import { useEnvironment } from '~~/server/utils/environment'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { labelAddress } from '~~/server/utils/labels/labelAddress'

/** GET /api/labels/address: what the symbols of labels lead to. */
export default apiRoute({ permission: 'labels:mint' }, () => labelAddress(useEnvironment().publicUrl))
