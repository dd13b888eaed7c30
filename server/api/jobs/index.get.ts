import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { listJobs } from '~~/server/utils/jobs/jobs'
import { jobsQuery } from '~~/utils/contract/jobs'

/** GET /api/jobs: the jobs, the newest first. */
export default apiRoute({ permission: 'jobs:read', query: jobsQuery }, ({ access, query }) => listJobs(useDatabase(), query, access.personId))
