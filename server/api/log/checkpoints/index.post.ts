import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'
import { checkpointNow } from '../../../utils/proof/checkpointNow'

/** POST /api/log/checkpoints: signs how the log stands now and writes it to the auditors. Sent twice it makes two. */
export default apiRoute({ permission: 'log:checkpoint', status: 201 }, ({ access }) => checkpointNow(useDatabase(), Date.now(), access.personId))
