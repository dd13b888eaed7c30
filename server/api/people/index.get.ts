import { peopleQuery } from '../../../utils/contract/people'
import { apiRoute } from '../../utils/http/apiRoute'
import { listPeople } from '../../utils/people/people'

/** GET /api/people: the firm's people, turned-off ones too unless `active` says otherwise. */
export default apiRoute({ permission: 'people:read', query: peopleQuery }, ({ access, query }) => {
  return listPeople(access, query.active === undefined ? undefined : query.active === 'true')
})
