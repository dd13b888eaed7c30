import { FITS, REACHES, type Fit, type Reach } from '../contract/ranking'
import type { CylinderView } from '../custody/cylinderView'
import type { FindingCode } from '../custody/finding'
import { mayFill } from '../custody/plan'
import { FINDING_WORDS, MISSING_WORDS } from '../custody/words'

/** A cylinder that might take it, and its view with the refrigerant asked about. */
export interface Candidate { view: CylinderView, reach: Reach }

/** A cylinder in the order of choice, with what speaks for it and against it. */
export interface RankedCylinder {
  view: CylinderView
  reach: Reach
  fit: Fit
  /** null where it is not weighed and where nothing may go in. */
  roomGrams: number | null
  /** In words, the weightiest first. */
  reasons: string[]
}

/** Two cylinders that take together what neither takes alone: how much goes into each. */
export type FillPair = [{ cylinder: RankedCylinder, grams: number }, { cylinder: RankedCylinder, grams: number }]

/** What is to be put away. Units: whole grams. */
export interface Asked { refrigerant: string, grams: number }

/**
 * The cylinders in the order in which they serve: whole amounts first, then those about which nothing is to be settled,
 * what is nearest, in date for long, already holding it, kept for it, evacuated, and of those the one with the smallest
 * room that suffices.
 *
 * One whose weight is not known has no room to promise: it stands behind those that have, and is to be weighed first.
 */
export function rankCylinders(candidates: readonly Candidate[], asked: Asked): RankedCylinder[] {
  return candidates.map(candidate => ranked(candidate, asked)).sort((one, other) => firstDifference(orderOf(one, asked), orderOf(other, asked)))
}

/**
 * The two that together take what no single one does: with the least to be settled, nearest, in date for long, and with the least room to spare; null
 * where one suffices or no two do.
 */
export function fillPair(cylinders: readonly RankedCylinder[], asked: Asked): FillPair | null {
  if (cylinders.some(({ fit }) => fit === 'whole')) return null
  const parts = cylinders.filter(({ fit }) => fit === 'part')
  let best: { pair: [RankedCylinder, RankedCylinder], order: number[] } | null = null
  for (const [at, one] of parts.entries()) {
    for (const other of parts.slice(at + 1)) {
      const room = one.roomGrams! + other.roomGrams!
      if (room < asked.grams) continue
      const order = [Number(isDoubtful(one)) + Number(isDoubtful(other)), REACHES.indexOf(one.reach) + REACHES.indexOf(other.reach), Number(isDueSoon(one)) + Number(isDueSoon(other)), room]
      if (best === null || firstDifference(order, best.order) < 0) best = { pair: [one, other], order }
    }
  }
  if (best === null) return null
  const [first, second] = best.pair
  return [{ cylinder: first, grams: first.roomGrams! }, { cylinder: second, grams: asked.grams - first.roomGrams! }]
}

function ranked({ view, reach }: Candidate, asked: Asked): RankedCylinder {
  const against = whyNot(view, asked.refrigerant)
  if (against !== null) return { view, reach, fit: 'refused', roomGrams: null, reasons: [against] }
  const { roomGrams } = view.capacity
  const also = [
    ...toSettle(view),
    ...(isDueSoon({ view }) ? ['retest soon'] : []),
    ...(view.ownership === 'customer' ? ['a customer\'s: ask its owner first'] : []),
  ]
  const reasons = [standingOf(view, asked.refrigerant).words, ...also]
  if (roomGrams === null) return { view, reach, fit: 'not-weighed', roomGrams, reasons: ['not weighed: weigh it first', ...reasons] }
  return { view, reach, fit: roomGrams >= asked.grams ? 'whole' : 'part', roomGrams, reasons }
}

/** Why nothing of it may go in, by the rules of the trade and then by those of a plan to fill; null where it may. */
function whyNot(view: CylinderView, refrigerant: string): string | null {
  const { contents, stamp, capacity } = view
  if (!contents.nothingInIt && contents.refrigerant !== refrigerant) {
    return contents.refrigerant === null ? 'what is in it is not known' : `holds ${contents.refrigerant}`
  }
  if (contents.nothingInIt && stamp?.dedicatedTo && stamp.dedicatedTo !== refrigerant) return `kept for ${stamp.dedicatedTo}`
  const { allowed, because, missing } = mayFill(view)
  if (allowed) return null
  if (because.length > 0) return because.map(({ code }) => FINDING_WORDS[code]).join(', ')
  const unknown = missing.map(input => MISSING_WORDS[input])
  if (unknown.length > 0) return `not known: ${unknown.join(', ')}`
  return capacity.fillLimitGrams === null ? `no rule has a figure for ${refrigerant} in it` : 'no stop weight'
}

/** How it stands to the refrigerant, the best first. */
function standingOf({ contents, stamp }: CylinderView, refrigerant: string): { order: number, words: string } {
  if (!contents.nothingInIt) {
    if (contents.burnt) return { order: 4, words: `holds burnt ${refrigerant}` }
    return contents.condition === 'clean' ? { order: 0, words: `holds ${refrigerant}` } : { order: 4, words: `holds ${refrigerant}, ${contents.condition}` }
  }
  if (stamp?.dedicatedTo === refrigerant) return { order: 1, words: `empty, kept for ${refrigerant}` }
  return contents.evacuated ? { order: 2, words: 'empty, evacuated' } : { order: 3, words: 'empty, not evacuated' }
}

/** Findings that refuse no fill and are seen to before one all the same. */
const TO_SETTLE: readonly FindingCode[] = ['code-on-two', 'unsupervised', 'two-owners']

/** What is to be settled before anything goes in, in words. */
function toSettle({ findings, contents }: CylinderView): string[] {
  const words = TO_SETTLE.filter(code => findings.some(finding => finding.code === code)).map(code => FINDING_WORDS[code])
  const isAnothers = contents.owners.length === 1 && contents.owners[0]!.ownerId !== null
  return isAnothers ? [...words, 'what is in it is not ours: only the same owner\'s may go on top'] : words
}

function isDoubtful({ view }: Pick<RankedCylinder, 'view'>): boolean {
  return toSettle(view).length > 0
}

function isDueSoon({ view }: Pick<RankedCylinder, 'view'>): boolean {
  return view.findings.some(({ code }) => code === 'retest-soon')
}

function orderOf(cylinder: RankedCylinder, { refrigerant }: Asked): (number | string)[] {
  const { fit, reach, view, roomGrams } = cylinder
  // Of those that take all of it the smallest room that suffices; of those that take a part the largest.
  const room = roomGrams === null ? 0 : fit === 'part' ? -roomGrams : roomGrams
  return [
    FITS.indexOf(fit), Number(fit !== 'refused' && isDoubtful(cylinder)), REACHES.indexOf(reach), Number(isDueSoon(cylinder)),
    fit === 'refused' ? 0 : standingOf(view, refrigerant).order, room, view.labelCode ?? '', view.id,
  ]
}

function firstDifference(one: readonly (number | string)[], other: readonly (number | string)[]): number {
  const at = one.findIndex((value, index) => value !== other[index])
  return at === -1 ? 0 : one[at]! < other[at]! ? -1 : 1
}
