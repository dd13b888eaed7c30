import { fitFindings } from '../capacity/fit'
import { NEARLY_FULL_RATIO } from '../capacity/nearlyFull'
import type { FillPolicy } from '../capacity/types'
import type { Catalogue } from '../refrigerant/types'
import { endOf } from './endOf'
import type { Finding } from './finding'
import { holdFinding } from './findings/holds'
import { twoOwners } from './findings/mixing'
import { pairFindings } from './findings/pairs'
import { codeOnTwo, notRegistered } from './findings/record'
import { condemned, oldTareOnLabel } from './findings/retest'
import { standingFinding } from './findings/standing'
import { nearlyFull, overfill, weightNotKnown } from './findings/weight'
import type { SaidByOthers } from './saidByOthers'
import { judgedLimitGrams, judgedNetGrams, overfillGrams } from './judgedLimit'
import type { CylinderState, StandingCode } from './state'

/** What the standing findings depend on beside the cylinder; nothing of it is the date. */
export interface FindingContext extends SaidByOthers {
  policyNow: FillPolicy
  policyAt: (ms: number) => FillPolicy
  catalogue: Catalogue
}

const OF_CONTENTS: readonly StandingCode[] = ['second-refrigerant', 'unknown-onto-known', 'after-end']

/** Every finding of a state that stands whatever the date. A cylinder that has ended keeps only those of its contents. */
export function stateFindings(state: CylinderState, fillLimitGrams: number | null, context: FindingContext): Finding[] {
  const ofContents = [
    ...ofWeight(state, fillLimitGrams, context),
    ...ofFit(state, context.catalogue),
    ...state.standing.filter(({ code }) => OF_CONTENTS.includes(code)).map(standingFinding),
    ...(ownersIn(state) > 1 ? [twoOwners()] : []),
  ]
  if (endOf(state) !== null) return [...(state.condemnedAt === null ? [] : [condemned(state.condemnedAt)]), ...ofContents]
  return [
    ...ofContents,
    ...state.holds.map(holdFinding),
    ...state.standing.filter(({ code }) => !OF_CONTENTS.includes(code)).map(standingFinding),
    ...ofRecord(state, context),
  ]
}

function ofWeight(state: CylinderState, fillLimitGrams: number | null, context: FindingContext): Finding[] {
  const { contents } = state
  const excess = overfillGrams(state, judgedLimitGrams(state, context.policyNow, context.policyAt, context.catalogue))
  const notKnown = contents.netGrams === null ? [weightNotKnown(contents.asOf)] : []
  if (excess !== 0) return [overfill(excess, contents.netGrams === null, state.overfilledAt), ...notKnown]
  if (contents.nothingInIt || contents.netGrams === null || fillLimitGrams === null) return notKnown
  return contents.netGrams >= fillLimitGrams * NEARLY_FULL_RATIO ? [nearlyFull(fillLimitGrams - (judgedNetGrams(state) ?? contents.netGrams))] : []
}

// A mixture has no name, but it holds what went in: each of those still speaks against the cylinder, once for each code.
function ofFit({ stamp, contents, filledHere }: CylinderState, catalogue: Catalogue): Finding[] {
  if (stamp === null || contents.nothingInIt) return []
  const { refrigerant, knownSinceVacuum } = contents
  const names = refrigerant === null && knownSinceVacuum.length > 0 ? knownSinceVacuum : [refrigerant]
  const findings = names.flatMap(name => fitFindings({ stamp, refrigerant: name, catalogue }))
  return findings
    .filter(({ code }, index) => findings.findIndex(other => other.code === code) === index)
    .filter(({ code }) => code !== 'not-refillable' || filledHere)
    .map(finding => ({ ...finding, since: null }))
}

function ofRecord(state: CylinderState, { codesOnTwo, otherHalves }: SaidByOthers): Finding[] {
  const { registeredAt, firstEventAt, labels, labelCode, tare } = state
  const label = labels.find(({ code }) => code === labelCode)
  const isLabelOld = tare !== null && tare.isWeighedAnew && label !== undefined && label.lastAt < tare.since
  return [
    ...(registeredAt === null ? [notRegistered(firstEventAt)] : []),
    ...labels.filter(({ code }) => codesOnTwo.has(code)).map(({ code }) => codeOnTwo(code)),
    ...pairFindings(state.halves, otherHalves),
    ...(isLabelOld ? [oldTareOnLabel(tare.since)] : []),
  ]
}

function ownersIn({ contents }: CylinderState): number {
  if (contents.nothingInIt) return 0
  const holding = contents.shares.filter(({ grams }) => contents.netGrams === null || grams > 0)
  return new Set(holding.map(({ ownerId }) => ownerId)).size
}
