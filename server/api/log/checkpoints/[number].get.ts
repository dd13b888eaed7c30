import { setResponseHeaders } from 'h3'
import { checkpointParams } from '../../../../utils/contract/log'
import { useDatabase } from '../../../utils/database/currentDatabase'
import { apiRoute } from '../../../utils/http/apiRoute'
import { checkpointNote } from '../../../utils/proof/checkpoints'

/** GET /api/log/checkpoints/{number}: one checkpoint as it was signed, as a text to keep. */
export default apiRoute({ permission: 'log:checkpoint', params: checkpointParams }, async ({ event, params }) => {
  const note = await checkpointNote(useDatabase(), params.number)
  setResponseHeaders(event, {
    'Content-Type': 'text/plain; charset=utf-8', 'Content-Disposition': `attachment; filename="checkpoint-${params.number}.txt"`,
  })
  return note
})
