import { cancelDraft } from '~~/server/utils/cylinder-lists/drafts'
import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { testLotWithLines } from '~~/server/utils/test-lots/testLotWithLines'
import { idParams } from '~~/utils/contract/parts'

/** POST /api/test-lots/{id}/cancel: gives a draft up and frees its cylinders. Safe to send twice. */
export default apiRoute({ permission: 'lots:prepare', params: idParams }, async ({ access, params }) => {
  await cancelDraft(useDatabase(), { kind: 'test-lot', id: params.id })
  return testLotWithLines(useDatabase(), params.id, access, Date.now())
})
