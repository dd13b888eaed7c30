import { celsiusFromFahrenheit } from '../quantity/temperature'
import { curveThrough } from './monotoneCurve'
import { hasLiquidAt, liquidDensityAt } from './saturation'
import type { Catalogue, Composition, LiquidTable, Refrigerant } from './types'

/** A liquid's density by ideal mixing, or why there is none. */
export type IdealMixture = { fluid: LiquidTable } | { because: string }

/**
 * What an ideally mixed density is multiplied by, so that it stays under the true one.
 *
 * Source: ours. Of 36 blends whose own density is computed the plain sum of volumes is at most 4.0 % above it, R-500 at 131 F.
 */
const MIXING_DERATE = 0.95

// The components' volumes do not add up exactly; the derate covers what was seen on the unsafe side.
const MIXING_ERROR = 0.05

// Where no cylinder may be liquid-full, 49 CFR 173.304(b); a component must still be a liquid there.
const HOT_C = celsiusFromFahrenheit(131)

// Published shares are rounded to a tenth of a percent.
const SUM_TOLERANCE_PERCENT = 0.1
const FLOAT_NOISE = 1e-9

type Part = { component: Refrigerant, massShare: number }

/**
 * The liquid of a known composition that the catalogue has no properties of: the volumes of its parts added, less 5 %.
 *
 * It gives no pressure: by ideal mixing that would be up to 31 % off.
 * Units: kg/m3 over C, at the rows that all components have.
 * Errors: `because` where a component is not in the catalogue, named twice or a gas at 131 F (its table ends at 0.97 of its
 * critical temperature), and where the shares do not make up the whole.
 */
export function idealMixture(composition: Composition, catalogue: Catalogue): IdealMixture {
  const because = refusal(composition, catalogue)
  if (because !== null) return { because }
  const whole = sumOfPercents(composition)
  const parts = composition.components.flatMap(({ component, massPercent }): Part[] => {
    const known = catalogue.refrigerants.get(component)
    return known ? [{ component: known, massShare: massPercent / whole }] : []
  })
  const narrowest = parts.reduce((least, part) => part.component.tableMaxC < least.component.tableMaxC ? part : least)
  const table = narrowest.component.table
    .filter(({ tC }) => parts.every(({ component }) => hasLiquidAt(component, tC)))
    .map(({ tC }) => ({ tC, liquidDensity: MIXING_DERATE / specificVolume(parts, tC) }))
  return {
    fluid: {
      designation: composition.designation,
      source: `ideal mixing of the components' liquids, less 5 %; composition: ${composition.source}`,
      tableMaxC: narrowest.component.tableMaxC,
      relativeErrorDensity: MIXING_ERROR,
      table,
      curves: { liquidDensity: curveThrough(table.map(row => ({ x: row.tC, y: row.liquidDensity }))) },
      derate: MIXING_DERATE,
    },
  }
}

function specificVolume(parts: readonly Part[], tC: number): number {
  return parts.reduce((sum, { component, massShare }) => sum + massShare / liquidDensityAt(component, tC), 0)
}

function refusal({ designation, components }: Composition, catalogue: Catalogue): string | null {
  const named = new Set(components.map(({ component }) => component))
  if (named.size !== components.length) return `a component of ${designation} is named twice`
  for (const { component, massPercent } of components) {
    const known = catalogue.refrigerants.get(component)
    if (!known) return `no liquid density is held for ${component}`
    if (!(massPercent > 0)) return `the share of ${component} is not above 0 %`
    if (!hasLiquidAt(known, HOT_C)) return `${component} is near or above its critical temperature at 131 °F, where ideal mixing fails`
  }
  const whole = sumOfPercents({ components })
  if (!(Math.abs(whole - 100) <= SUM_TOLERANCE_PERCENT + FLOAT_NOISE)) return `the shares of ${designation} sum to ${Number(whole.toFixed(3))} %, not to 100 %`
  return null
}

function sumOfPercents({ components }: Pick<Composition, 'components'>): number {
  return components.reduce((sum, { massPercent }) => sum + massPercent, 0)
}
