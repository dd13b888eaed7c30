import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { changeJob } from '~~/server/utils/jobs/changeJob'
import { theJob } from '~~/server/utils/jobs/jobs'
import { jobChange } from '~~/utils/contract/jobs'
import { idParams } from '~~/utils/contract/parts'

/** PATCH /api/jobs/{id}: mends what was said of it; its note becomes a new issue. Safe to send twice. */
export default apiRoute({ permission: 'jobs:record', params: idParams, body: jobChange }, async ({ params, body }) => {
  await changeJob(useDatabase(), params.id, body)
  return theJob(useDatabase(), params.id)
})
