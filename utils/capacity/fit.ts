import { psigFromKPa } from '../quantity/pressure'
import { isFlammable, isToxic } from '../refrigerant/safety'
import { bubblePressureAt, hasLiquidAt } from '../refrigerant/saturation'
import type { Catalogue, Refrigerant } from '../refrigerant/types'
import type { RowFit } from './fillingDensities'
import { fillingDensityRows, isLiquefiedGasSpec, markedPressurePsig, rowFit } from './fillingDensities'
import { HOT_PRESSURE_FACTOR, mostDensity } from './rules/hotPressure'
import { HOT_REFERENCE_C } from './rules/ruleInput'
import type { FitFinding, Stamp } from './types'

const NON_REFILLABLE_SPEC = 'DOT-39'
const SPECS_NOT_FOR_TOXIC = ['DOT-4E', 'DOT-39']

// Least marked pressure of the row for refrigerants that the table does not name, 49 CFR 173.304a(a)(2).
const LEAST_MARKED_PSIG = 240

const NAMED_SOURCE = '49 CFR 173.304a(a)(2)'

/** Everything that speaks against putting a refrigerant into a cylinder, by its stamp alone. */
export function fitFindings(input: { stamp: Stamp, refrigerant: string | null, catalogue: Catalogue }): FitFinding[] {
  const { stamp, catalogue } = input
  const refrigerant = input.refrigerant === null ? null : catalogue.refrigerants.get(input.refrigerant) ?? null
  const findings = [notRefillable(stamp)]
  if (input.refrigerant !== null) {
    const safetyClass = refrigerant?.safetyClass ?? null
    const rowFits = fillingDensityRows(input.refrigerant).map(row => rowFit(row, stamp))
    findings.push(
      pressureClass(stamp, input.refrigerant, refrigerant, rowFits, catalogue),
      specNotForGas(stamp, input.refrigerant, safetyClass, rowFits),
      notMarkedFlammable(stamp, input.refrigerant, refrigerant),
      toxic(input.refrigerant, refrigerant),
    )
  }
  return findings.filter(finding => finding !== null)
}

function notRefillable(stamp: Stamp): FitFinding | null {
  if (stamp.spec !== NON_REFILLABLE_SPEC) return null
  return {
    code: 'not-refillable',
    severity: 'stop',
    text: 'A DOT-39 is made to be used once. Nothing is ever put back into it.',
    source: '49 CFR 178.65(i)',
  }
}

function pressureClass(
  stamp: Stamp, designation: string, refrigerant: Refrigerant | null, rowFits: readonly RowFit[], catalogue: Catalogue,
): FitFinding | null {
  const marked = markedPressurePsig(stamp)
  if (rowFits.length > 0) {
    if (rowFits.includes('met') || !rowFits.includes('mark-below') || marked === null) return null
    return stopForPressure(`The service pressure of ${marked} psig is below the least mark for ${designation}.`, NAMED_SOURCE)
  }
  if (!refrigerant) return stopForPressure(`No pressure is known for ${designation}.`, '49 CFR 173.301a(d)')
  // Without a mark there is no plan to fill in any case; the fill limit names it as missing.
  if (marked === null) return null
  if (marked < LEAST_MARKED_PSIG) {
    return stopForPressure(`The service pressure of ${marked} psig is below ${LEAST_MARKED_PSIG} psig.`, NAMED_SOURCE)
  }
  return hotPressureStop(marked, refrigerant, catalogue)
}

function hotPressureStop(marked: number, refrigerant: Refrigerant, catalogue: Catalogue): FitFinding | null {
  const { designation } = refrigerant
  const source = `49 CFR 173.301a(d); pressure: ${refrigerant.source}`
  const allowedPsig = HOT_PRESSURE_FACTOR * marked
  if (!hasLiquidAt(refrigerant, HOT_REFERENCE_C)) {
    const table = catalogue.supercritical.get(designation)
    if (table && mostDensity(table, marked) !== null) return null
    const gasSource = `49 CFR 173.301a(c), (d); pressure: ${refrigerant.source}`
    return stopForPressure(`The service pressure of ${marked} psig is too low for ${designation}, a gas at 131 °F.`, gasSource)
  }
  const hotPsig = psigFromKPa(bubblePressureAt(refrigerant, HOT_REFERENCE_C) * (1 + refrigerant.relativeErrorPressure))
  if (hotPsig <= allowedPsig) return null
  const text = `${designation} may reach ${Math.ceil(hotPsig)} psig at 131 °F; a service pressure of ${marked} psig `
    + `allows ${Math.floor(allowedPsig)} psig.`
  return stopForPressure(text, source)
}

function stopForPressure(text: string, source: string): FitFinding {
  return { code: 'pressure-class', severity: 'stop', text, source }
}

function specNotForGas(stamp: Stamp, designation: string, safetyClass: string | null, rowFits: RowFit[]): FitFinding | null {
  if (SPECS_NOT_FOR_TOXIC.includes(stamp.spec) && isToxic(safetyClass)) {
    return {
      code: 'spec-not-for-gas',
      severity: 'stop',
      text: `A ${stamp.spec} may not hold a toxic gas; ${designation} counts as one.`,
      source: '49 CFR 173.304a(a)(1)',
    }
  }
  const named = rowFits.length > 0
  const authorised = named ? rowFits.some(fit => fit !== 'spec-not-listed') : isLiquefiedGasSpec(stamp.spec)
  if (authorised) return null
  return {
    code: 'spec-not-for-gas',
    severity: 'stop',
    text: `A ${stamp.spec} is not authorised for ${designation}.`,
    source: named ? NAMED_SOURCE : '49 CFR 173.304a(a)(1)',
  }
}

function notMarkedFlammable(stamp: Stamp, designation: string, refrigerant: Refrigerant | null): FitFinding | null {
  if (stamp.flammableMarked || !isFlammable(refrigerant?.safetyClass ?? null)) return null
  const safety = safetyWords(refrigerant)
  return {
    code: 'not-marked-flammable',
    severity: 'stop',
    text: `${designation} ${safety.isOrCountsAs} flammable; this cylinder is not marked for flammables.`,
    source: `${safety.source}; a cylinder marked for flammables: common practice, no source`,
  }
}

function toxic(designation: string, refrigerant: Refrigerant | null): FitFinding | null {
  if (!isToxic(refrigerant?.safetyClass ?? null)) return null
  const safety = safetyWords(refrigerant)
  return {
    code: 'toxic',
    severity: 'caution',
    text: `${designation} ${safety.isOrCountsAs} toxic. Keep the room aired and stay out of low places.`,
    source: safety.source,
  }
}

function safetyWords(refrigerant: Refrigerant | null): { isOrCountsAs: string, source: string } {
  const safetyClass = refrigerant?.safetyClass ?? null
  if (!refrigerant || safetyClass === null) {
    return { isOrCountsAs: 'has no known safety class and counts as', source: 'ANSI/ASHRAE Standard 34: class not known' }
  }
  const fromMemory = refrigerant.safetyClassStatus === 'from memory' ? ', from memory' : ''
  return { isOrCountsAs: 'is', source: `ANSI/ASHRAE Standard 34, class ${safetyClass}${fromMemory}` }
}
