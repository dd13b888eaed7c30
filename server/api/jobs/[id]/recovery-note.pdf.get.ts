import { setResponseHeaders } from 'h3'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { theJob } from '~~/server/utils/jobs/jobs'
import { noteFileName, printedRecoveryNote } from '~~/server/utils/jobs/recoveryNote'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/jobs/{id}/recovery-note.pdf: the note of a job as the log now stands. Changes nothing. */
export default apiRoute({ permission: 'jobs:read', params: idParams }, async ({ event, params }) => {
  const db = useDatabase()
  const job = await theJob(db, params.id)
  const pdf = await printedRecoveryNote(db, job, Date.now())
  setResponseHeaders(event, { 'Content-Type': 'application/pdf', 'Content-Disposition': `inline; filename="${noteFileName(job)}"` })
  return pdf
})
