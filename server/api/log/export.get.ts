import { Readable } from 'node:stream'
import { setResponseHeaders } from 'h3'
import { useDatabase } from '../../utils/database/currentDatabase'
import { directory } from '../../utils/directory/directory'
import { apiRoute } from '../../utils/http/apiRoute'
import { begun } from '../../utils/http/begun'
import { exportedLog } from '../../utils/proof/exportLog'
import { sealingNow } from '../../utils/proof/sealing'

/** GET /api/log/export: the whole log and its checkpoints as lines of JSON, as fast as they are taken. */
export default apiRoute({ permission: 'log:export' }, async ({ event }) => {
  const db = useDatabase()
  // The first lines before the answer: what cannot begin is told as a problem.
  const lines = await begun(exportedLog(db, await sealingNow(db), await directory(db, true), Date.now()))
  setResponseHeaders(event, {
    'Content-Type': 'application/x-ndjson; charset=utf-8', 'Content-Disposition': 'attachment; filename="custody-log.ndjson"',
  })
  return Readable.from(lines, { objectMode: false })
})
