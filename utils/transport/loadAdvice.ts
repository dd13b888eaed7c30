import type { StatusKind } from '../picture/status'
import { formatMass, type MassUnit } from '../quantity/mass'
import { MATERIALS_OF_TRADE, PLACARD_FROM_GRAMS, type VanLoad } from './vanLoad'

/** What a van's load comes to in one line, what is not known of it, and what to do. */
export interface LoadAdvice { kind: StatusKind, text: string, unknown: string[], todo: string[] }

const PAPERS = 'Or carry a shipping paper (49 CFR 172.200) with a telephone number that is answered in an emergency (172.604), and let someone drive who is trained for it (172.704).'

/** Says a van's load to its crew. Rounding: what is left goes down, what is too much up. */
export function loadAdvice(load: VanLoad, unit: MassUnit): LoadAdvice {
  const { isOver, tooHeavy, withoutWeight, otherGrams, leftGrams } = load
  const unknown = [
    withoutWeight > 0 && `${withoutWeight === 1 ? '1 cylinder is' : `${withoutWeight} cylinders are`} not weighed and not counted here. Weigh ${withoutWeight === 1 ? 'it' : 'them'}.`,
    otherGrams === null && 'What else is carried is not said: torch gases, nitrogen, paint and fuel count as well.',
  ].filter(line => line !== false)
  const each = formatMass(MATERIALS_OF_TRADE.eachGrams, unit, 'down')
  const source = MATERIALS_OF_TRADE.source
  if (isOver) {
    const excess = formatMass(-leftGrams, unit, 'up')
    return {
      kind: 'att', unknown,
      text: `${excess} above what goes without a shipping paper (${source}(d)).`,
      todo: [
        `Leave at least ${excess} behind.`,
        PAPERS,
        ...(load.allGrams >= PLACARD_FROM_GRAMS ? [`From ${formatMass(PLACARD_FROM_GRAMS, unit, 'nearest')} gross of these gases on, the vehicle is placarded (49 CFR 172.504(c)).`] : []),
      ],
    }
  }
  if (tooHeavy > 0) {
    const heavy = tooHeavy === 1 ? '1 cylinder is' : `${tooHeavy} cylinders are`
    return {
      kind: 'att', unknown,
      text: `${heavy} above ${each}: not without a shipping paper (${source}(a)(2)).`,
      todo: [`Leave ${tooHeavy === 1 ? 'it' : 'them'} behind.`, PAPERS],
    }
  }
  return {
    kind: unknown.length > 0 ? 'unk' : 'ok', unknown, todo: [],
    text: `${formatMass(leftGrams, unit, 'down')} more without a shipping paper, no cylinder above ${each} (${source}).`,
  }
}
