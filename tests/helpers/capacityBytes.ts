import { heatCurve } from '../../utils/capacity/heat'
import type { FillPolicy } from '../../utils/capacity/types'
import { fillLimitQuery } from '../../utils/contract/refrigerants'
import { CATALOGUE } from '../../utils/refrigerant/allRefrigerants'
import { saturationAt } from '../../utils/refrigerant/saturation'
import { fillLimitAnswer } from '../../server/utils/refrigerants/fillLimitAnswer'

/** What GET /api/fill-limit answers to each query, byte for byte, worked out wherever this runs. */
export function fillLimitBytes(queries: Record<string, string>[], policy: FillPolicy): string[] {
  return queries.map(query => JSON.stringify(fillLimitAnswer(fillLimitQuery.parse(query), policy)))
}

/** Saturation between the rows of every table, and a cylinder as it warms, byte for byte. */
export function propertyBytes(): string[] {
  return [...CATALOGUE.refrigerants.values()].map((refrigerant) => {
    const temperatures = Array.from({ length: 20 }, (_, index) => -40 + (refrigerant.tableMaxC + 40) * (index + 0.37) / 20)
    const waterCapacity = { unit: 'lb' as const, value: 47.6 }
    return JSON.stringify([
      refrigerant.designation,
      temperatures.map(tC => saturationAt(refrigerant, tC)),
      heatCurve({ netGrams: 15_000, waterCapacity, refrigerant, supercritical: null }, temperatures),
    ])
  })
}
