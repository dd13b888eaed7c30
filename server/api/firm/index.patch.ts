import { ownFirmChange } from '../../../utils/contract/firm'
import { changeOwnFirm } from '../../utils/firm'
import { apiRoute } from '../../utils/http/apiRoute'

/** PATCH /api/firm: name, telephone, time zone, units, and what papers say of the shipper. Safe to send twice. */
export default apiRoute({ permission: 'settings:manage', body: ownFirmChange }, ({ access, body }) => changeOwnFirm(body, access, Date.now()))
