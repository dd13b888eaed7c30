import { WATER_DENSITY_60F, volumeLitres } from '../capacity/rules/ruleInput'
import { litresText, shareText } from '../capacity/rules/sumText'
import type { LiquidFull } from '../capacity/liquidFull'
import type { PolicyAnswer } from '../contract/policy'
import { formatInstant } from '../quantity/instant'
import { formatMass, type MassReading, type MassUnit } from '../quantity/mass'
import type { Refrigerant } from '../refrigerant/types'
import { liquidFullWords } from './heatWords'
import type { Deed } from './sumSources'

/** A line under the rules: a figure that follows from the sum, with how it was reached. */
export type WorkingFact = { term: string, value: string | null, reason?: string, figure: true }

const UNITS: readonly MassUnit[] = ['lb', 'lb-oz', 'kg']

/** What follows from the sum: the stop weight in the other units, the volume, the liquid-full temperature. Rounding: stop weight and temperature down. */
export function workingFacts(of: {
  exactStopWeightGrams: number | null
  waterCapacity: MassReading | null
  liquidFull: LiquidFull | null
  nothingInIt: boolean
}, unit: MassUnit): WorkingFact[] {
  const { exactStopWeightGrams: stop, waterCapacity, liquidFull } = of
  const others = stop === null ? null : UNITS.filter(each => each !== unit).map(each => formatMass(stop, each, 'down')).join(', ')
  return [
    { term: 'Stop weight in the other units, also rounded down', value: others, reason: 'no stop weight', figure: true },
    { term: `Volume, WC ÷ ${WATER_DENSITY_60F} kg/L (water at 60 °F)`, value: waterCapacity && litresText(volumeLitres(waterCapacity)).replace(' ', '\u00A0'), figure: true },
    { term: `Liquid-full, ${of.nothingInIt ? 'when filled to the limit' : 'as much as is in it now'}`, value: liquidFull && liquidFullWords(liquidFull), figure: true },
  ]
}

/** How well the densities of a refrigerant are known, in a sentence. */
export function densityNote({ designation, accuracyGroup, relativeErrorDensity, doubt, source }:
Pick<Refrigerant, 'designation' | 'accuracyGroup' | 'relativeErrorDensity' | 'doubt' | 'source'>): string {
  const within = `about ${Number((relativeErrorDensity * 100).toFixed(2))} % (an estimate)`
  return `Densities of ${designation}: accuracy group ${accuracyGroup}, ${within}. ${doubt ? `In doubt: ${doubt.replace(/\.$/, '')}. ` : ''}Computed by ${source}.`
}

/** When and by whom the stamp was read, in a sentence. */
export function stampNote({ atMs, by }: Deed, timeZone: string): string {
  return `Stamp read ${writtenOut(atMs, timeZone)} by ${by}.`
}

/** The fill rule in force and whose it is, in a sentence. */
export function policyNote({ fillPolicy, rules, timeZone }: Pick<PolicyAnswer, 'fillPolicy' | 'rules' | 'timeZone'>, nowMs: number): string {
  const begun = rules.filter(rule => rule.kind === 'fill-policy' && rule.withdrawn === null && rule.fromAt <= nowMs)
  const set = begun.reduce<PolicyAnswer['rules'][number] | null>((latest, rule) => latest && latest.fromAt >= rule.fromAt ? latest : rule, null)
  const figures = `share ${shareText(fillPolicy.shareThousandths)}, ceiling ${shareText(fillPolicy.ceilingThousandths)} of liquid-full at 131 °F`
  return set
    ? `Fill rule of ${writtenOut(set.fromAt, timeZone)}, set by ${set.setBy.name}: ${figures}. Reason: ${set.reason.replace(/\.$/, '')}.`
    : `Fill rule: the default, ${figures}. The firm has set none of its own.`
}

// With its year, whatever the reader's.
function writtenOut(ms: number, timeZone: string): string {
  return formatInstant(ms, timeZone, 0)
}
