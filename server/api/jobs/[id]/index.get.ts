import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { theJob } from '~~/server/utils/jobs/jobs'
import { idParams } from '~~/utils/contract/parts'

/** GET /api/jobs/{id}: a job, what was recovered there as the log now stands, and which notes of it were sent. */
export default apiRoute({ permission: 'jobs:read', params: idParams }, ({ params }) => theJob(useDatabase(), params.id))
