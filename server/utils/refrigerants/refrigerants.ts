import type { CompositionRecordAnswer, RefrigerantRecordAnswer, RefrigerantsAnswer, SaturationAnswer } from '~~/utils/contract/refrigerants'
import { celsiusFromFahrenheit } from '~~/utils/quantity/temperature'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { asListed } from '~~/utils/refrigerant/designation'
import { GWP_BASES, gwpOf } from '~~/utils/refrigerant/gwp'
import { catalogueLines } from '~~/utils/refrigerant/lines'
import { pressureClassOf } from '~~/utils/refrigerant/pressureClass'
import { isFlammable, isToxic } from '~~/utils/refrigerant/safety'
import { hasLiquidAt, saturationAt } from '~~/utils/refrigerant/saturation'
import type { Composition, Refrigerant } from '~~/utils/refrigerant/types'
import { noUnEntryBecause, unEntryOf } from '~~/utils/refrigerant/unEntry'
import { problem } from '../http/problem'

// Ice; a shop; the temperatures of 80 % by volume, of the pressure classes, and of full cylinders (49 CFR 173.304a(a)(2), 173.304(b)).
const NAMED_TEMPERATURES_F = [32, 70, 77, 104, 130, 131]

// A table that ends at 21.1 °C ends at 70 °F.
const SAME_TEMPERATURE_K = 0.05

/** Every refrigerant of the catalogue in its order, and the blends of which only the composition is known. */
export function refrigerantList(): RefrigerantsAnswer {
  const { items, compositions } = catalogueLines(CATALOGUE)
  return { items, nextCursor: null, total: items.length, compositions }
}

/** What is known of one refrigerant, or of a blend's composition. Errors: 404 where nothing has this name. */
export function refrigerantRecord(designation: string): RefrigerantRecordAnswer | CompositionRecordAnswer {
  const blend = named(CATALOGUE.compositions, designation)
  return blend ? compositionRecord(blend) : propertiesRecord(refrigerantNamed(designation))
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

function propertiesRecord(refrigerant: Refrigerant): RefrigerantRecordAnswer {
  const { table, curves: _, ...record } = refrigerant
  return {
    ...record, known: 'properties', flammable: isFlammable(record.safetyClass), toxic: isToxic(record.safetyClass),
    pressureClass: pressureClassOf(refrigerant),
    gwp: GWP_BASES.map(basis => gwpOf(refrigerant, basis)),
    ...namedForTransport(refrigerant),
    points: NAMED_TEMPERATURES_F.map(temperatureF => pointAt(refrigerant, temperatureF)),
    curve: table.map(({ tC, bubblePressureKPa, dewPressureKPa }) => ({ tC, bubblePressureKPa, dewPressureKPa })),
  }
}

function compositionRecord({ designation, components, source }: Composition): CompositionRecordAnswer {
  const composition = [...components]
  return {
    known: 'composition', designation, composition, compositionSource: source,
    gwp: GWP_BASES.map(basis => gwpOf({ composition }, basis)),
    ...namedForTransport({ designation, composition, safetyClass: null }),
  }
}

function namedForTransport(refrigerant: Parameters<typeof unEntryOf>[0]) {
  const unEntry = unEntryOf(refrigerant)
  return { unEntry, noUnEntryBecause: unEntry ? null : noUnEntryBecause(refrigerant) }
}

function pointAt(refrigerant: Refrigerant, temperatureF: number) {
  const exactC = celsiusFromFahrenheit(temperatureF)
  const isTableEnd = Math.abs(exactC - refrigerant.tableMaxC) < SAME_TEMPERATURE_K
  const temperatureC = isTableEnd ? refrigerant.tableMaxC : exactC
  return { temperatureF, temperatureC, saturation: hasLiquidAt(refrigerant, temperatureC) ? saturationAt(refrigerant, temperatureC) : null }
}

/** The refrigerant of the catalogue by its designation in any case. Errors: 404 where the catalogue has none of this name. */
export function refrigerantNamed(designation: string): Refrigerant {
  const found = named(CATALOGUE.refrigerants, designation)
  if (!found) throw problem(404, 'No such refrigerant', 'The catalogue does not have it under this name.')
  return found
}

function named<T>(map: ReadonlyMap<string, T>, designation: string): T | undefined {
  return map.get(asListed(designation, map.keys()))
}
