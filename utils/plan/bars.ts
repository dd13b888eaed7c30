import type { FindingCode } from '../custody/finding'
import { isEmptyByScale, mayDraw, mayFill, type Planned } from '../custody/plan'
import { MISSING_WORDS } from '../custody/words'
import type { Lot } from './lot'

/** A cylinder as a plan looks at it. */
export interface PlanCylinder {
  view: Planned
  /** Of one with nothing in it: the same, asked about each refrigerant that could go in. */
  asked: ReadonlyMap<string, Planned>
  /** The place that it stands at, racks and shelves counted with the shop that they are in; null where nobody knows. */
  siteId: string | null
  /** The open list or plan on which it stands, within a sentence; null where on none. */
  standsOn: string | null
}

/** Until these are settled nobody can say which cylinder it is, or answer for what is in it. */
const IN_DOUBT: readonly FindingCode[] = ['code-on-two', 'unsupervised', 'second-refrigerant', 'unknown-onto-known', 'condemned', 'after-end', 'quarantined']

/** Why nothing is planned out of a cylinder that holds something; null where it may be emptied. */
export function whyNotEmptied({ view, standsOn }: PlanCylinder): string | null {
  return standingBar(view, standsOn) ?? drawBar(view) ?? doubtBar(view) ?? contentsBar(view)
}

/** Why a cylinder takes nothing of a lot; null where it may. Its room is another question. */
export function whyNotFilled({ view, standsOn }: PlanCylinder, lot: Pick<Lot, 'refrigerant' | 'ownerId' | 'burnt'>): string | null {
  return standingBar(view, standsOn) ?? fillBar(view) ?? doubtBar(view) ?? lotBar(view, lot) ?? (view.contents.nothingInIt ? null : contentsBar(view))
}

function contentsBar({ contents }: Planned): string | null {
  const { refrigerant, condition, burnt, netGrams, owners } = contents
  if (condition === 'mixed' || condition === 'unknown' || refrigerant === null) return 'What is in it is mixed or not known: it never moves onto anything, and nothing onto it.'
  if (netGrams === null) return 'What is in it is not known by weight. Weigh it first.'
  if (owners.length > 1) return 'Refrigerant of two owners is in it. It goes to a reclaimer as it is.'
  if (burnt && condition === 'clean') return 'It is called clean, but burnt refrigerant was in it since its last deep vacuum.'
  return null
}

function standingBar(view: Planned, standsOn: string | null): string | null {
  if (standsOn !== null) return `It stands on ${standsOn}.`
  if (view.stamp === null) return 'It is not registered.'
  return view.place === null ? 'Nobody has said where it is.' : null
}

function drawBar(view: Planned): string | null {
  const { allowed, because } = mayDraw(view)
  if (!allowed) return because[0]?.text ?? null
  // Emptying these frees no cylinder that could be filled again.
  if (view.stamp?.spec === 'DOT-39') return 'A DOT-39 is never filled again (49 CFR 178.65(i)), so emptying it frees no cylinder.'
  return view.capacity.refusals.find(({ code }) => code === 'after-end')?.text ?? null
}

function fillBar(view: Planned): string | null {
  const { allowed, because, missing } = mayFill(view)
  if (allowed) return null
  if (because[0]) return because[0].text
  return missing.length > 0 ? `Not known: ${missing.map(input => MISSING_WORDS[input]).join(', ')}.` : 'No rule has a figure for this refrigerant in this cylinder.'
}

function doubtBar(view: Planned): string | null {
  return view.findings.find(({ code }) => IN_DOUBT.includes(code))?.text ?? null
}

function lotBar(view: Planned, { refrigerant, ownerId, burnt }: Pick<Lot, 'refrigerant' | 'ownerId' | 'burnt'>): string | null {
  const { forRefrigerant } = view.capacity
  if (forRefrigerant !== refrigerant) return forRefrigerant === null ? 'Nobody has said what it is for.' : `It is kept for ${forRefrigerant}.`
  if (view.ownership === 'customer' && (view.owner?.id ?? null) !== ownerId) return 'The cylinder is a customer\'s, and the refrigerant is not.'
  return isEmptyByScale(view) && view.contents.burnt && !burnt ? 'Burnt refrigerant was in it since its last deep vacuum.' : null
}
