import { supervisorsFor } from '../../../utils/access/supervisors'
import type { Directory } from '../directory/directory'
import { rolesOf } from '../session/person'

/** Whether one person may supervise another's training, as the firm knows both now. */
export function maySupervise(from: Pick<Directory, 'people'>, supervisorId: string, traineeId: string): boolean {
  const named = from.people.get(supervisorId)
  return named !== undefined && supervisorsFor([{ ...named, roles: rolesOf(named) }], traineeId).length > 0
}
