import type { CylinderView } from '../custody/cylinderView'
import { mayTake } from '../custody/plan'
import { FINDING_WORDS } from '../custody/words'
import { contentsWord, isCodeOnTwo, verdictOf } from '../picture/verdict'
import type { StatusKind } from '../picture/status'
import { formatMass, type MassUnit } from '../quantity/mass'
import { isPlan, type BatchAct } from './batchAct'

/**
 * How a cylinder stands in a batch: it counts; it is refused and counts only with a reason; it is there already, so
 * that nothing is to be recorded; or its code is on two cylinders and it must be said which one is meant.
 */
export type BatchStanding = 'counted' | 'refused' | 'there' | 'which'

/** What a line of a batch says. */
export interface BatchVerdict {
  standing: BatchStanding
  kind: StatusKind
  text: string
  /** Codes of the findings that speak against it. */
  against: string[]
}

/** What a cylinder in a batch is judged against. */
export interface BatchQuestion {
  act: BatchAct
  /** The place that it is to come to; null while none is chosen. */
  target: { id: string, name: string } | null
  /** The cylinders that are expected; null where any may come. */
  expectedIds: ReadonlySet<string> | null
  /** Why the person keeps it although it is refused. */
  keepReason: string | null
  /** Its serial was read, so that a code on two cylinders does not matter. */
  isChosen: boolean
}

/**
 * What to say of a cylinder that was scanned into a batch.
 *
 * A plan is refused with its reason and may be kept with another one; what has happened counts, whatever it is.
 * Rounding: a room down, an excess up.
 */
export function batchVerdict(view: CylinderView, question: BatchQuestion, unit: MassUnit): BatchVerdict {
  const { act, target, expectedIds, keepReason, isChosen } = question
  if (isCodeOnTwo(view) && !isChosen) return { standing: 'which', kind: 'stop', text: 'This code is on two cylinders.', against: ['code-on-two'] }
  if (act !== 'receive' && target && view.place?.id === target.id) {
    return { standing: 'there', kind: 'att', text: `It is at ${target.name} already.`, against: [] }
  }
  const isUnexpected = expectedIds !== null && !expectedIds.has(view.id)
  const { allowed, because } = mayTake(view)
  if (isPlan(act) && (!allowed || isUnexpected)) {
    const why = allowed ? 'It is not on the list.' : because[0]!.text
    const against = because.map(({ code }) => code)
    if (keepReason === null) return { standing: 'refused', kind: 'stop', text: `Not this cylinder. ${why}`, against }
    return { standing: 'counted', kind: 'att', text: `Kept: ${keepReason}`, against }
  }
  return { standing: 'counted', against: [], ...contentsOf(view, unit, isUnexpected) }
}

function contentsOf(view: CylinderView, unit: MassUnit, isUnexpected: boolean): Pick<BatchVerdict, 'kind' | 'text'> {
  const contents = contentsWord(view)
  const also = isUnexpected ? ', not on the list' : ''
  if (view.findings.some(({ code }) => code === 'overfill')) {
    return { kind: 'stop', text: `${contents}, ${lowerFirst(verdictOf(view, unit).text)}${also}` }
  }
  const { roomGrams } = view.capacity
  const worst = view.findings.find(({ severity }) => severity === 'stop') ?? view.findings[0]
  const parts = [contents, worst && FINDING_WORDS[worst.code], roomGrams !== null && roomGrams >= 0 && `room ${formatMass(roomGrams, unit, 'down')}`]
  const isUnknown = !view.contents.nothingInIt && view.contents.refrigerant === null
  const kind = worst || isUnexpected ? 'att' : isUnknown ? 'unk' : 'ok'
  return { kind, text: parts.filter(Boolean).join(', ') + also }
}

function lowerFirst(text: string): string {
  return text.charAt(0).toLowerCase() + text.slice(1)
}
