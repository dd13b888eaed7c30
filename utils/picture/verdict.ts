import type { CylinderView } from '../custody/cylinderView'
import { FINDING_WORDS, LIFECYCLE_WORDS, MISSING_WORDS } from '../custody/words'
import { formatMass, type MassUnit } from '../quantity/mass'
import type { StatusKind } from './status'

/** What a screen says of a cylinder first: one line, and where it keeps from filling, why in a sentence. */
export interface Verdict {
  kind: StatusKind
  text: string
  /** Stands in the place of the stop weight; null where that is given. */
  reason: string | null
  /** Where the reason comes from, where a rule gave it. */
  source: string | null
}

/**
 * Whether something may go into a cylinder now, and how much, in one line.
 *
 * Rounding: the room down, an excess up.
 */
export function verdictOf(view: CylinderView, unit: MassUnit): Verdict {
  const { capacity, contents } = view
  const overfill = view.findings.find(finding => finding.code === 'overfill')
  if (overfill) return { kind: 'stop', text: excessText(view, unit), reason: overfill.text, source: overfill.source }
  if (!view.stamp) return { kind: 'unk', text: 'Not registered yet', reason: 'Its stamp is not in the log, so no weight can be given.', source: null }

  const condemned = view.findings.find(finding => finding.code === 'condemned')
  if (condemned) return { kind: 'stop', text: 'Condemned: never fill it again', reason: condemned.text, source: condemned.source }
  const retired = view.lifecycle === 'retired' ? capacity.refusals.find(({ code }) => code === 'after-end') : undefined
  if (retired) return { kind: 'stop', text: 'Retired: never fill it again', reason: retired.text, source: retired.source }
  const refusal = capacity.refusals[0]
  if (refusal) return { kind: 'stop', text: `Do not fill: ${refusal.code === 'away' ? LIFECYCLE_WORDS[view.lifecycle] : FINDING_WORDS[refusal.code]}`, reason: refusal.text, source: refusal.source }
  if (!contents.nothingInIt && contents.refrigerant === null) {
    if (contents.condition === 'mixed') {
      return { kind: 'stop', text: 'Do not fill: contents mixed', reason: 'More than one refrigerant is in it. Nothing goes in until it is emptied to a deep vacuum.', source: null }
    }
    return { kind: 'stop', text: 'Do not fill: contents not known', reason: 'What is in it is not known. Nothing goes in until it is identified or emptied to a deep vacuum.', source: null }
  }

  const missing = capacity.missing.filter(each => each !== 'weight')
  if (capacity.stopWeightGrams === null) {
    if (contents.nothingInIt && capacity.forRefrigerant === null) {
      return { kind: 'ok', text: 'Nothing in it', reason: 'Choose the refrigerant that is to go in, and the weight to stop at stands here.', source: null }
    }
    const what = missing.map(each => MISSING_WORDS[each]).join(' and ')
    return { kind: 'unk', text: 'No stop weight', reason: what ? `Not known: ${what}.` : 'No rule has a figure for this refrigerant in this cylinder.', source: null }
  }
  return roomVerdict(view, unit)
}

/** Whether the label that leads here was recorded on another cylinder as well. */
export function isCodeOnTwo({ findings }: CylinderView): boolean {
  return findings.some(finding => finding.code === 'code-on-two')
}

/** The same as {@link verdictOf} for whoever has only read the label: a code on two cylinders says nothing of either. */
export function verdictOfScan(view: CylinderView, unit: MassUnit): Verdict {
  if (!isCodeOnTwo(view)) return verdictOf(view, unit)
  return { kind: 'stop', text: 'This code is on two cylinders', reason: 'Open it, and give the last four of the serial on its collar.', source: null }
}

function roomVerdict({ capacity, contents, findings }: CylinderView, unit: MassUnit): Verdict {
  const { roomGrams, forRefrigerant } = capacity
  if (roomGrams === null) return { kind: 'att', text: 'Not weighed: the room is not known', reason: null, source: null }
  const isNearlyFull = findings.some(finding => finding.code === 'nearly-full')
  if (isNearlyFull && roomGrams <= (contents.uncertaintyGrams ?? 0)) return { kind: 'att', text: 'Full', reason: null, source: null }
  // What joins a burnt charge counts as burnt as well.
  const isBurnt = contents.burnt && !contents.nothingInIt
  const text = `Room for ${formatMass(roomGrams, unit, 'down')} of ${isBurnt ? 'burnt ' : ''}${forRefrigerant ?? 'refrigerant'}`
  return { kind: isNearlyFull || isBurnt ? 'att' : 'ok', text, reason: null, source: null }
}

function excessText({ capacity, contents }: CylinderView, unit: MassUnit): string {
  const { fillLimitGrams } = capacity
  if (fillLimitGrams === null || contents.netGrams === null || contents.netGrams <= fillLimitGrams) return 'Overfilled'
  return `Overfilled by ${formatMass(contents.netGrams - fillLimitGrams, unit, 'up')}`
}

/** What stands at the right of the stamp plate: the refrigerant, or that there is none, that it is mixed or not known. */
export function contentsWord({ contents }: CylinderView): string {
  if (contents.nothingInIt) return 'empty'
  return contents.refrigerant ?? (contents.condition === 'mixed' ? 'mixed' : 'unknown')
}
