import { parseFigure } from '../../quantity/figure'
import { gaugeUnitFor } from '../../quantity/gauge'
import { emptyPressureEntry, pressureEntryOf, readPressureEntry, type PressureEntry } from '../../refrigerant/pressureEntry'
import { MOST_PERCENT_TOGETHER } from '../analysis'
import type { Condition } from '../cylinderView'
import { typedText, type DraftKind } from './draft'
import { NOT_KNOWN } from './filled'

/** How the contents were checked. */
export type CheckMethod = 'pressure' | 'identifier' | 'laboratory'

/** A line of an analysis as it is typed. */
export interface ComponentRow { component: string, percent: string }

/** What an analysis says, as its fields hold it. */
export interface AnalysisDraft {
  parts: ComponentRow[]
  /** A designation, {@link NOT_KNOWN} where none fits, or '' while none is chosen. */
  refrigerant: string
  condition: Condition | ''
}

export interface CheckedDraft { method: CheckMethod, pressure: PressureEntry, analysis: AnalysisDraft }

/** The form of a check of what is in a cylinder. */
export const CHECKED: DraftKind<'checked', CheckedDraft> = {
  empty: ({ unit }) => ({ method: 'pressure', pressure: emptyPressureEntry(gaugeUnitFor(unit)), analysis: emptyAnalysis() }),
  read: ({ method, pressure, analysis }) => {
    if (method === 'pressure') {
      const read = readPressureEntry(pressure)
      return 'reason' in read ? read : { details: { method, ...read.reading } }
    }
    const parts = readParts(analysis.parts)
    if ('reason' in parts) return parts
    const { refrigerant, condition } = analysis
    if (refrigerant === '') return { reason: 'Choose what it was found to be.' }
    if (condition === '') return { reason: 'Choose the condition it was found in.' }
    const isNamed = refrigerant !== NOT_KNOWN
    if (!isNamed && condition === 'clean') return { reason: 'What cannot be named is not clean. Choose another condition.' }
    return {
      details: {
        method,
        ...(parts.composition.length > 0 && { composition: parts.composition }),
        verdict: { refrigerant: isNamed ? refrigerant : null, condition },
      },
    }
  },
  of: (details, _, unit) => {
    const gauge = gaugeUnitFor(unit)
    if (details.method === 'pressure') {
      return { method: details.method, pressure: pressureEntryOf(details, gauge), analysis: emptyAnalysis() }
    }
    const { method, composition = [], verdict } = details
    return {
      method,
      pressure: emptyPressureEntry(gauge),
      analysis: {
        parts: [...composition.map(part => ({ component: part.component, percent: String(part.massPercent) })), emptyRow()],
        refrigerant: verdict.refrigerant ?? NOT_KNOWN,
        condition: verdict.condition,
      },
    }
  },
}

/** A line with nothing in it yet. */
export function emptyRow(): ComponentRow {
  return { component: '', percent: '' }
}

function emptyAnalysis(): AnalysisDraft {
  return { parts: [emptyRow()], refrigerant: '', condition: '' }
}

function readParts(rows: readonly ComponentRow[]): { composition: { component: string, massPercent: number }[] } | { reason: string } {
  const composition: { component: string, massPercent: number }[] = []
  for (const { component, percent } of rows) {
    const name = typedText(component)
    const share = parseFigure(percent)
    if (name === undefined && 'error' in share && share.error === 'empty') continue
    if (name === undefined) return { reason: 'Name each part that has a percentage.' }
    if (!('value' in share) || share.value > 100) return { reason: `Give ${name} as a percentage, such as 98.5.` }
    if (composition.some(part => part.component.toUpperCase() === name.toUpperCase())) return { reason: `${name} stands there twice.` }
    composition.push({ component: name, massPercent: share.value })
  }
  const sum = composition.reduce((total, part) => total + part.massPercent, 0)
  return sum > MOST_PERCENT_TOGETHER ? { reason: 'The parts come to more than 100 %.' } : { composition }
}
