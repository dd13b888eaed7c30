import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { mintLabels } from '~~/server/utils/labels/mintLabels'
import { mintBody, type MintAnswer } from '~~/utils/contract/labels'

/** POST /api/labels: new codes, each for one cylinder. Sent twice it makes others, and the first stay unused. */
export default apiRoute({ permission: 'labels:mint', body: mintBody, status: 201 }, async ({ access, body }): Promise<MintAnswer> =>
  ({ codes: await mintLabels(useDatabase(), body.count, access.personId, Date.now()) }))
