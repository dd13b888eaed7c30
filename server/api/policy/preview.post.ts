import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { previewRule } from '~~/server/utils/rules/previewRule'
import { ruleDraft } from '~~/utils/contract/policy'

/** POST /api/policy/preview: what a rule would change of the fleet as it is. Changes nothing. */
export default apiRoute({ permission: 'rules:set', body: ruleDraft }, ({ body }) => previewRule(useDatabase(), body, Date.now()))
