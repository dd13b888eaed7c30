import { problem } from '../http/problem'

/**
 * Refuses a name that another of the same sort has, whatever its capitals and spaces.
 *
 * Errors: 409 `name-taken`, with whose name it is.
 */
export function refuseTakenName(others: Iterable<{ id: string, name: string, active: boolean }>, { id, name }: { id: string, name: string }): void {
  const other = [...others].find(each => each.id !== id && nameKey(each.name) === nameKey(name))
  if (!other) return
  const detail = other.active ? `${other.name} is there already. Choose another name, or change that one.` : `${other.name} is there already, turned off. Use it again, or choose another name.`
  throw problem(409, 'The name is taken', detail, [{ path: 'name', message: other.active ? 'is taken' : 'is taken by one that is turned off' }], { type: 'name-taken' })
}

/** A name as it is told from another. */
export function nameKey(name: string): string {
  return name.normalize('NFKC').trim().replace(/\s+/g, ' ').toLowerCase()
}
