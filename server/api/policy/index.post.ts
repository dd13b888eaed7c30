import { useDatabase } from '~~/server/utils/database/currentDatabase'
import { apiRoute } from '~~/server/utils/http/apiRoute'
import { insistOn } from '~~/server/utils/http/insistOn'
import { setRule } from '~~/server/utils/rules/setRule'
import { ruleBody } from '~~/utils/contract/policy'

/** POST /api/policy: a fill rule or retest settings from now or a later day on. With an id of the sender's own it may be sent twice. */
export default apiRoute({ permission: 'rules:set', body: ruleBody, status: 201 }, async ({ person, access, body }) => {
  if (body.kind === 'fill-policy') await insistOn(person, 'fill-rule:set')
  return setRule(useDatabase(), body, access, Date.now)
})
