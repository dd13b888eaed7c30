import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { asListed } from '~~/utils/refrigerant/designation'
import { problem } from '../http/problem'

/** A refrigerant as the catalogue spells it. Errors: 422 where it has none of this name. */
export function listedRefrigerant(designation: string | null): string | null {
  if (designation === null) return null
  const names = [...CATALOGUE.refrigerants.keys(), ...CATALOGUE.compositions.keys()]
  const listed = asListed(designation, names)
  if (names.includes(listed)) return listed
  throw problem(422, 'No such refrigerant', 'Choose it from the list, or leave it open.', [{ path: 'refrigerant', message: 'is not in the catalogue' }])
}
