import { ruleWithShare } from '../capacity/words'
import type { CylinderView } from '../custody/cylinderView'
import { formatNear } from '../quantity/instant'
import { exactGrams, formatFigure, type MassRounding, type MassUnit } from '../quantity/mass'
import type { Deed, SumSources } from './sumSources'

/** One line of the sum; where there is no figure, why. */
export type SumLine = {
  words: string
  note: string | null
  figure: { figure: string, symbol: string } | null
  reason: string
  /** Drawn under a line: a result of those above. */
  isResult: boolean
  isEnd: boolean
}

/** How instants are written for the reader. */
export type Clock = { nowMs: number, timeZone: string }

/**
 * The sum behind a stop weight, set like an account: scale, less tare, net, fill limit, room, stop weight.
 *
 * Rounding: readings, tare and net to the nearest division, limit, room and stop weight down; each figure on its own.
 */
export function sumAccount(view: CylinderView, sources: SumSources, unit: MassUnit, clock: Clock): SumLine[] {
  const { capacity, contents, stamp } = view
  const as = (grams: number | null, rounding: MassRounding) => grams === null ? null : formatFigure(grams, unit, rounding)
  const tareGrams = stamp?.tareWeightGrams ?? null
  const isRefused = capacity.refusals.length > 0
  const line = (words: string, note: string | null, figure: SumLine['figure'], reason: string, more: Partial<SumLine> = {}): SumLine =>
    ({ words, note, figure, reason, isResult: false, isEnd: false, ...more })
  return [
    line('Scale reads', sources.weighing && `${byWhom(sources.weighing, clock)}, hoses off`, sources.weighing && as(exactGrams(sources.weighing.gross), 'nearest'), whyNoReading(view)),
    line('less tare weight', sources.newTare ? `new tare at a retest, ${byWhom(sources.newTare, clock)}` : 'stamp', as(tareGrams === null ? null : -tareGrams, 'nearest'), 'not known'),
    line('Net', contents.nothingInIt ? 'nothing in it' : 'in it now', as(contents.netGrams, 'nearest'), 'not weighed', { isResult: true }),
    line('Fill limit', limitNote(view), as(capacity.fillLimitGrams, 'down'), capacity.forRefrigerant ? 'no rule gives one' : contents.nothingInIt ? 'by refrigerant' : 'not known'),
    line('Room', 'limit less net', as(capacity.roomGrams, 'down'), isRefused ? 'not usable' : contents.netGrams === null ? 'not weighed' : 'not known', { isResult: true }),
    line('Stop weight', 'tare plus limit', as(capacity.exactStopWeightGrams, 'down'), isRefused ? 'nothing may go in' : 'not known', { isResult: true, isEnd: true }),
  ]
}

function limitNote({ capacity }: CylinderView): string | null {
  const rule = capacity.governingRule && ruleWithShare(capacity.governingRule, capacity.share)
  return [rule, capacity.forRefrigerant && `of ${capacity.forRefrigerant}`].filter(Boolean).join(', ') || null
}

function whyNoReading({ contents }: CylinderView): string {
  if (contents.basis === 'reckoned') return 'the net was reckoned, not weighed'
  return contents.nothingInIt ? 'not weighed since it was emptied' : 'not weighed'
}

/** When and by whom, as people near it say it. */
function byWhom({ atMs, by }: Deed, { nowMs, timeZone }: Clock): string {
  return `${formatNear(atMs, timeZone, nowMs)} by ${by}`
}
