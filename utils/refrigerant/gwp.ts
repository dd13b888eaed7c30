import { COMPONENT_GWPS, WHY_NO_GWP } from './data/componentGwps'
import type { HowKnown } from './data/componentGwps'
import type { Refrigerant } from './types'

/** The lists that a GWP is taken from: three IPCC reports, the law of the United States, that of the EU and the one before it. */
export const GWP_BASES = ['AR4', 'AR5', 'AR6', 'exchange-value', 'EU-2024/573', 'EU-517/2014'] as const
export type GwpBasis = typeof GWP_BASES[number]

/** One component's share in a GWP; `gwp` null where the basis has no value for it. */
export interface GwpPart { component: string, massPercent: number, gwp: number | null, source: string | null, known: HowKnown | null }

/** A 100-year GWP on one basis, with what it is summed from. */
export interface Gwp {
  basis: GwpBasis
  value: number | null
  /** Why there is no value. */
  because?: string
  parts: GwpPart[]
  /** Whether a component's value was never looked up. */
  fromMemory: boolean
}

/**
 * The 100-year GWP of a refrigerant on a basis: of a blend the sum of mass fraction times component value.
 *
 * Units: kg of CO2 for one kg. Rounding: to four decimals, below what any component is known to.
 * Source: 40 CFR 84.64(b) for the sum; each part carries the source of its value.
 */
export function gwpOf(refrigerant: Pick<Refrigerant, 'composition'>, basis: GwpBasis): Gwp {
  const parts = refrigerant.composition.map(({ component, massPercent }) => partOf(component, massPercent, basis))
  const fromMemory = parts.some(part => part.known === 'from memory')
  const because = whyUnknown(parts, basis)
  return because === null ? { basis, value: sumOf(parts), parts, fromMemory } : { basis, value: null, because, parts, fromMemory }
}

// The law of the land first; then the list that its values were taken from; then what still names the rest.
const HEADLINE_ORDER: readonly GwpBasis[] = ['exchange-value', 'AR4', 'EU-517/2014', 'EU-2024/573', 'AR6', 'AR5']

/** The GWP that stands for a refrigerant where there is room for one; null where no basis has it. */
export function headlineGwp(refrigerant: Pick<Refrigerant, 'composition'>): { basis: GwpBasis, value: number } | null {
  for (const basis of HEADLINE_ORDER) {
    const { value } = gwpOf(refrigerant, basis)
    if (value !== null) return { basis, value }
  }
  return null
}

function sumOf(parts: readonly GwpPart[]): number {
  const sum = parts.reduce((total, { massPercent, gwp }) => total + massPercent / 100 * (gwp ?? 0), 0)
  return Math.round(sum * 10_000) / 10_000
}

function whyUnknown(parts: readonly GwpPart[], basis: GwpBasis): string | null {
  if (parts.length === 0) return 'its composition is not known'
  const unknown = parts.filter(part => part.gwp === null)
  if (unknown.length === 0) return null
  const reason = `${unknown.map(part => part.component).join(', ')} ${WHY_NO_GWP[basis]}`
  const rest = parts.filter(part => part.gwp !== null)
  if (rest.length === 0) return reason
  const percent = Math.round(rest.reduce((total, { massPercent }) => total + massPercent, 0) * 10) / 10
  return `${reason}; the other ${percent} % of it sum to ${Math.round(sumOf(rest)).toLocaleString('en-US')}`
}

function partOf(component: string, massPercent: number, basis: GwpBasis): GwpPart {
  for (const { source, known, values } of COMPONENT_GWPS[basis]) {
    const gwp = values[component]
    if (gwp !== undefined) return { component, massPercent, gwp, source, known }
  }
  return { component, massPercent, gwp: null, source: null, known: null }
}
