import { KPA_PER_PSI } from '../quantity/pressure'
import type { PressureClassing } from '../refrigerant/pressureClass'
import { pressureClassInWords } from '../refrigerant/words'
import { SMALL_CHARGE_GRAMS, type TableCell } from './evacuationTable'
import type { TableAnswer } from './tableLevel'
import type { AccountLine, EvacuationInput, EvacuationLevel } from './types'
import { CHARGE_BAND_WORDS, CIRCUMSTANCES_WORDS, formatCharge, levelWords, MACHINE_MADE_WORDS } from './words'

interface Found {
  input: EvacuationInput
  classing: PressureClassing | null
  cell: TableCell
  matters: TableAnswer['matters']
  level: EvacuationLevel
}

/** How a level of the table was found, line by line, and what was taken for what was not known. */
export function accountOf(found: Found): { account: AccountLine[], assumed: string[] } {
  const lines = [applianceLine(found), classLine(found), chargeLine(found), machineLine(found), rowLine(found), circumstancesLine(found)]
    .filter(line => line !== null)
  return {
    account: lines.map(({ assumption: _, ...line }) => line),
    assumed: lines.flatMap(({ assumption }) => assumption === null ? [] : [assumption]),
  }
}

type Line = AccountLine & { assumption: string | null }

function applianceLine({ input }: Found): Line | null {
  if (input.appliance !== 'small') return null
  const assumption = `More than ${formatCharge(SMALL_CHARGE_GRAMS)} is no small appliance (40 CFR 82.152): taken as any other.`
  return { term: 'Appliance', value: 'any other', note: 'too much in it for a small one', isAssumed: true, assumption }
}

function classLine({ input, classing, cell, matters }: Found): Line {
  const term = 'Pressure class'
  if (!input.refrigerant || !classing) {
    const assumption = matters.pressureClass ? 'The refrigerant is not known: taken as low pressure, the row that asks for most.' : null
    return { term, value: 'refrigerant not known', note: `taken as ${pressureClassInWords(cell.pressureClass)}`, isAssumed: true, assumption }
  }
  const { designation } = input.refrigerant
  const value = pressureClassInWords(cell.pressureClass)
  const at104F = 'aboveCritical' in classing.at104F
    ? `${designation} is above its critical temperature at 104 °F`
    : `${designation} stands at ${psia(classing.at104F.bubblePressureKPa)} psia at 104 °F`
  if (!classing.nearBound) return { term, value, note: `${at104F}; ${classing.source}`, isAssumed: false, assumption: null }
  const between = `${at104F}, near the bound of ${Math.round(classing.nearBound.boundKPa / KPA_PER_PSI)} psia between ${pressureClassInWords(classing.pressureClass)} and ${pressureClassInWords(classing.nearBound.pressureClass)}`
  if (!matters.pressureClass) return { term, value, note: `${between}; both ask for the same here`, isAssumed: false, assumption: null }
  return { term, value, note: `${between}; the one that asks for more counts`, isAssumed: true, assumption: `${between}: taken as ${value}, which asks for more.` }
}

function chargeLine({ input, cell, matters }: Found): Line {
  const line = { term: 'Full charge', value: formatCharge(input.chargeGrams) }
  if (input.chargeGrams !== null) return { ...line, note: CHARGE_BAND_WORDS[cell.charge], isAssumed: false, assumption: null }
  if (!matters.charge) return { ...line, note: 'makes no difference here', isAssumed: false, assumption: null }
  return { ...line, note: 'taken as 200 lb or more', isAssumed: true, assumption: 'The charge is not known: taken as 200 lb or more, which asks for more.' }
}

function machineLine({ input, matters }: Found): Line {
  const line = { term: 'Recovery machine', value: input.machineMade ? `made ${MACHINE_MADE_WORDS[input.machineMade]}` : 'date not known' }
  if (input.machineMade) return { ...line, note: null, isAssumed: false, assumption: null }
  if (!matters.machineMade) return { ...line, note: 'makes no difference here', isAssumed: false, assumption: null }
  return { ...line, note: 'taken as 15 Nov 1993 or later', isAssumed: true, assumption: 'The machine’s date is not known: taken as 15 Nov 1993 or later, which asks for more.' }
}

function rowLine({ cell }: Found): Line {
  return { term: 'The table asks for', value: levelWords(cell.level), note: rowName(cell), isAssumed: false, assumption: null }
}

function circumstancesLine({ input, cell, level }: Found): Line | null {
  const term = 'Why it is opened'
  if (input.circumstances === null) {
    const assumption = 'Why it is opened is not said: taken as a major repair or a disposal, which asks for more.'
    return { term, value: 'not said', note: 'taken as a major repair or a disposal', isAssumed: true, assumption }
  }
  const isLess = level !== cell.level
  const note = isLess ? `${levelWords(level)} in place of the table` : input.circumstances === 'leaking' ? 'the table holds for the sound parts' : 'the table holds'
  return { term, value: CIRCUMSTANCES_WORDS[input.circumstances], note, isAssumed: false, assumption: null }
}

function rowName(cell: TableCell): string {
  const hasOneRow = cell.pressureClass === 'very-high' || cell.pressureClass === 'low'
  const row = pressureClassInWords(cell.pressureClass)
  return `row “${row}${hasOneRow ? '' : `, ${CHARGE_BAND_WORDS[cell.charge]}`}”`
}

function psia(kPa: number): string {
  return (kPa / KPA_PER_PSI).toFixed(1)
}
