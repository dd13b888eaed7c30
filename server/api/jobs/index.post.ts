import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { createJob } from '~~/server/utils/jobs/createJob'
import { theJob } from '~~/server/utils/jobs/jobs'
import { jobBody } from '~~/utils/contract/jobs'

/** POST /api/jobs: a visit to a customer's equipment. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'jobs:record', body: jobBody, status: 201 }, async ({ access, body }) =>
  theJob(useDatabase(), await createJob(useDatabase(), body, access.personId, Date.now())))
