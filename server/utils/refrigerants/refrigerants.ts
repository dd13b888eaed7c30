import type { RefrigerantLine, RefrigerantRecordAnswer, SaturationAnswer } from '~~/utils/contract/refrigerants'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { isFlammable, isToxic } from '~~/utils/refrigerant/safety'
import { hasLiquidAt, saturationAt } from '~~/utils/refrigerant/saturation'
import type { Refrigerant } from '~~/utils/refrigerant/types'
import { problem } from '../http/problem'

/** Every refrigerant of the catalogue, in its order. */
export function refrigerantLines(): RefrigerantLine[] {
  return [...CATALOGUE.refrigerants.values()].map(({ designation, kind, safetyClass, accuracyGroup }) => ({
    designation, kind, safetyClass, accuracyGroup, flammable: isFlammable(safetyClass), toxic: isToxic(safetyClass),
  }))
}

/** What is known of one refrigerant, without its table. Errors: 404 where the catalogue has none of this name. */
export function refrigerantRecord(designation: string): RefrigerantRecordAnswer {
  const { table: _, ...record } = refrigerantNamed(designation)
  return { ...record, flammable: isFlammable(record.safetyClass), toxic: isToxic(record.safetyClass) }
}

/** Saturation of a refrigerant. Errors: 404; 422 outside its table. */
export function saturationOf(designation: string, temperatureC: number): SaturationAnswer {
  const refrigerant = refrigerantNamed(designation)
  if (!hasLiquidAt(refrigerant, temperatureC)) {
    const coldest = refrigerant.table[0]?.tC ?? refrigerant.tableMaxC
    throw problem(422, 'Outside the table', `${refrigerant.designation} has saturation data from ${coldest} °C to ${refrigerant.tableMaxC} °C.`, [
      { path: 'temperatureC', message: 'is outside the table' },
    ])
  }
  return saturationAt(refrigerant, temperatureC)
}

/** A refrigerant of the catalogue by its name, in any case. Errors: 404 where it has none of this name. */
export function refrigerantNamed(designation: string): Refrigerant {
  const wanted = designation.toUpperCase()
  const found = CATALOGUE.refrigerants.get(designation)
    ?? [...CATALOGUE.refrigerants.values()].find(one => one.designation.toUpperCase() === wanted)
  if (!found) throw problem(404, 'No such refrigerant', 'The catalogue does not have it under this name.')
  return found
}
