import { personChange, personParams, type PersonAnswer } from '../../../../utils/contract/people'
import { apiRoute } from '../../../utils/http/apiRoute'
import { changePerson } from '../../../utils/people/people'

/** PATCH /api/people/{id}: name, roles, trainee, certification, usual supervisor, van, on or off. Safe to send twice. */
export default apiRoute({ permission: 'people:manage', params: personParams, body: personChange }, async ({ access, params, body }): Promise<PersonAnswer> => {
  return { person: await changePerson(params.id, body, access, Date.now()) }
})
