import { checkpointsQuery } from '../../../../utils/contract/log'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'
import { listCheckpoints } from '../../../utils/proof/checkpoints'
import { sealingNow } from '../../../utils/proof/sealing'

/** GET /api/log/checkpoints: the checkpoints, newest first, and the public key that they are signed with. */
export default apiRoute({ permission: 'log:checkpoint', query: checkpointsQuery }, async ({ query }) =>
  listCheckpoints(useDatabase(), await sealingNow(useDatabase()), query))
