import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { insistOn } from '~~/server/utils/http/insistOn'
import { kindOfRule, withdrawRule } from '~~/server/utils/rules/withdrawRule'
import { withdrawBody } from '~~/utils/contract/policy'
import { idParams } from '~~/utils/contract/parts'

/** POST /api/policy/{id}/withdraw: takes back a rule that has not begun; the history keeps both. Safe to send twice. */
export default apiRoute({ permission: 'rules:set', params: idParams, body: withdrawBody }, async ({ person, access, params, body }) => {
  const db = useDatabase()
  if (await kindOfRule(db, params.id) === 'fill-policy') await insistOn(person, 'fill-rule:set')
  return withdrawRule(db, params.id, body.reason, access, Date.now)
})
