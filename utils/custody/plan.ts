import type { CylinderView, Missing } from './cylinderView'
import type { Finding, FindingCode } from './finding'
import { newOwnerBecause, ownerChange } from './findings/owner'
import { notShippable } from './findings/record'
import { hasContents } from './findings/retest'

/** What of a view a plan is judged by. */
export type Planned = Omit<CylinderView, 'may' | 'mayNot'>

/** Whether something may be planned, and what speaks against it. */
export interface PlanAnswer {
  allowed: boolean
  because: Finding[]
  /** What must be known first. */
  missing: Missing[]
}

/** Whether somebody may take it along, onto a van or to another place. */
export function mayTake(view: Planned): PlanAnswer {
  return answer([...standing(view, 'overfill'), ...gone(view), ...ended(view)])
}

/** Whether refrigerant may be put in: never where no rule gives a weight to stop at. */
export function mayFill(view: Planned): PlanAnswer {
  const { refusals, missing, roomGrams, stopWeightGrams } = view.capacity
  const isFull = roomGrams !== null && roomGrams <= 0
  const full = [...standing(view, 'overfill'), ...(isFull ? standing(view, 'nearly-full') : [])]
  const answered = answer([...full, ...refusals], missing.filter(input => input !== 'weight'))
  return { ...answered, allowed: answered.allowed && stopWeightGrams !== null }
}

/**
 * Whether refrigerant may be drawn from it.
 *
 * @param use what for and, where that is known, into whose equipment; left out, whether anything may be drawn at all.
 */
export function mayDraw(view: Planned, use?: Parameters<typeof newOwnerBecause>[1]): PlanAnswer {
  const because = use && !view.contents.nothingInIt ? newOwnerBecause(view.contents.owners.map(({ ownerId }) => ownerId), use) : null
  return answer([...gone(view), ...(because ? [ownerChange(because)] : [])])
}

/** Whether it may be given to a firm in an exchange, with what is in it. */
export function mayGiveAway(view: Planned, firm: { isReclaimer: boolean }): PlanAnswer {
  return answer([...mayTake(view).because, ...(firm.isReclaimer || isEmptyByScale(view) ? [] : [ownerChange('given-away')])])
}

/** Whether what is in it may be checked. */
export function mayCheck(view: Planned): PlanAnswer {
  return answer(gone(view))
}

/** Whether it may leave on a shipment to a reclaimer. Mixed contents and a passed date may; the papers say so. */
export function mayShip(view: Planned): PlanAnswer {
  return answer([
    ...(view.labelCode === null ? [notShippable('It has no label. Label it first, so that the papers and the cylinder name each other.')] : []),
    ...standing(view, 'not-registered'),
    ...standing(view, 'overfill'),
    ...(view.stamp?.spec === 'DOT-39' ? [notShippable('A DOT-39 that was filled again may not be moved by road.', '49 CFR 178.65(i)')] : []),
    ...gone(view),
    ...ended(view),
  ])
}

/** Whether it may leave for its requalification: never with contents. */
export function mayTest(view: Planned): PlanAnswer {
  return answer([
    ...(isEmptyByScale(view) ? [] : [...standing(view, 'retest-overdue'), hasContents(view.contents.netGrams)]),
    ...standing(view, 'not-registered'),
    ...gone(view),
    ...ended(view),
  ])
}

/** Whether the scale cannot tell what is in it from nothing. */
export function isEmptyByScale({ contents: { nothingInIt, netGrams, uncertaintyGrams } }: Planned): boolean {
  return nothingInIt || (netGrams !== null && netGrams <= (uncertaintyGrams ?? 0))
}

function answer(because: Finding[], missing: Missing[] = []): PlanAnswer {
  return { allowed: because.length === 0 && missing.length === 0, because, missing }
}

function standing(view: Planned, code: FindingCode): Finding[] {
  return view.findings.filter(finding => finding.code === code)
}

function gone(view: Planned): Finding[] {
  return view.capacity.refusals.filter(({ code }) => code === 'away')
}

function ended(view: Planned): Finding[] {
  const condemned = standing(view, 'condemned')
  return condemned.length > 0 ? condemned : view.capacity.refusals.filter(({ code }) => code === 'after-end')
}
