import { isUnexplained, type MovementCause } from '../movement'
import type { CylinderState, Share } from '../state'
import type { Turn } from './turn'

/**
 * Sets the net and books the change: by share of the owners, under the refrigerant's present name.
 *
 * A net that was not known enters whole as `opening`; one that becomes unknown leaves under the event's cause. What is
 * out of stock is counted but not booked.
 *
 * @param accuracyGrams of the reading that tells the net, where one does; 0 where it is the one that told it before.
 */
export function changeNet(turn: Turn, net: number | null, cause: MovementCause, accuracyGrams?: number): void {
  const { contents } = turn.state
  const before = contents.netGrams
  if (before === null && net === null) return
  const change = (net ?? 0) - (before ?? 0)
  ensureOwner(turn)
  const parts = splitByShare(change, contents.shares)
  if (before !== null && net !== null && accuracyGrams !== undefined && isUnexplained(cause)) findDifference(turn, accuracyGrams)
  for (const { ownerId, grams } of parts) book(turn, before === null ? 'opening' : cause, contents.refrigerant, ownerId, grams)
  if (net !== null) {
    contents.shares = before === null ? parts : prune(add(contents.shares, parts))
    contents.lastKnownNetGrams = net
  }
  contents.netGrams = net
}

/**
 * Puts refrigerant of one owner in: booked under the name it came with, and at once under the name it has now.
 *
 * Only for a gain between two known nets.
 */
export function putIn(turn: Turn, grams: number, cause: MovementCause, name: string | null, ownerId: string | null): void {
  const { contents } = turn.state
  if (contents.netGrams === null) return
  book(turn, cause, name, ownerId, grams)
  if (name !== contents.refrigerant) {
    book(turn, 'renamed', name, ownerId, -grams)
    book(turn, 'renamed', contents.refrigerant, ownerId, grams)
  }
  contents.shares = prune(add(contents.shares, [{ ownerId, grams }]))
  contents.netGrams += grams
  contents.lastKnownNetGrams = contents.netGrams
}

/** Gives the contents another name, or one owner, without a change of weight. */
export function rename(turn: Turn, refrigerant: string | null, ownerId?: string | null): void {
  const { contents } = turn.state
  const shares = ownerId === undefined ? contents.shares : [{ ownerId, grams: sum(contents.shares) }]
  const isSame = refrigerant === contents.refrigerant && shares.length === contents.shares.length
    && shares.every((share, index) => share.ownerId === contents.shares[index]?.ownerId)
  if (!isSame && contents.netGrams !== null) {
    for (const share of contents.shares) book(turn, 'renamed', contents.refrigerant, share.ownerId, -share.grams)
    for (const share of shares) book(turn, 'renamed', refrigerant, share.ownerId, share.grams)
  }
  contents.refrigerant = refrigerant
  contents.shares = shares
}

/** Takes the known net out of stock, booked under a cause. */
export function leaveStock(turn: Turn, cause: 'shipped' | 'returned-with'): void {
  const { contents } = turn.state
  if (contents.netGrams !== null) {
    for (const share of contents.shares) book(turn, cause, contents.refrigerant, share.ownerId, -share.grams)
  }
  contents.inStock = false
}

/** Takes the known net back into stock, booked as an opening. */
export function enterStock(turn: Turn): void {
  const { contents } = turn.state
  if (contents.inStock) return
  contents.inStock = true
  if (contents.netGrams === null) return
  for (const share of contents.shares) book(turn, 'opening', contents.refrigerant, share.ownerId, share.grams)
}

/**
 * What is known to be in a cylinder came with it, and is the contractor's from now on: what was booked as found in it
 * leaves the books as that, and enters them as received.
 */
export function receiveAnew(turn: Turn): void {
  const { contents } = turn.state
  if (contents.shares.length === 0) return
  const total = sum(contents.shares)
  if (contents.netGrams !== null) {
    for (const share of contents.shares) book(turn, 'opening', contents.refrigerant, share.ownerId, -share.grams)
    book(turn, 'received-with', contents.refrigerant, null, total)
  }
  contents.shares = [{ ownerId: null, grams: total }]
}

/** Whose it is where no event says: the customer's in a customer's cylinder, else the contractor's. */
export function ownerOfFound(state: CylinderState): string | null {
  return state.ownership === 'customer' ? state.ownerId : null
}

/** Makes sure that an owner is on the books, with nothing yet. */
export function nameOwner(turn: Turn, ownerId: string | null): void {
  const { contents } = turn.state
  if (!contents.shares.some(share => share.ownerId === ownerId)) contents.shares = [...contents.shares, { ownerId, grams: 0 }]
}

/**
 * An amount divided among owners by their shares. Rounding: whole grams; the last ones to the largest share, but never
 * more out of a share than it holds. Shares without weight divide evenly.
 *
 * @example splitByShare(-5, [{ ownerId: 'a', grams: 2 }, { ownerId: 'b', grams: 1 }]) // a: -4, b: -1
 */
function splitByShare(grams: number, shares: readonly Share[]): Share[] {
  const total = sum(shares)
  const sign = grams < 0 ? -1 : 1
  const amount = Math.abs(grams)
  const weightOf = (share: Share) => total > 0 ? share.grams : 1
  const weights = total > 0 ? total : shares.length
  const parts = shares.map(share => ({ ownerId: share.ownerId, grams: Math.floor(amount * weightOf(share) / weights) }))
  const byLargest = shares.map((_, index) => index).sort((a, b) => weightOf(shares[b]!) - weightOf(shares[a]!) || a - b)
  let left = amount - sum(parts)
  while (left > 0) {
    const open = byLargest.find(index => sign > 0 || total < amount || parts[index]!.grams < shares[index]!.grams) ?? byLargest[0]
    if (open === undefined) break
    parts[open]!.grams += 1
    left -= 1
  }
  return parts.map(part => ({ ...part, grams: part.grams === 0 ? 0 : sign * part.grams }))
}

function ensureOwner(turn: Turn): void {
  if (turn.state.contents.shares.length === 0) nameOwner(turn, ownerOfFound(turn.state))
}

// The readings before and after were taken on like scales and may be off the same way: their uncertainties add. A net
// that was reckoned rests on no reading and adds none.
function findDifference({ state, found }: Turn, accuracyGrams: number): void {
  const { inStock, refrigerant, shares, uncertaintyGrams } = state.contents
  if (!inStock) return
  const both = (uncertaintyGrams ?? 0) + accuracyGrams
  const { parts, whole } = partsOf(both, shares)
  shares.forEach(({ ownerId }, index) => found.push({ refrigerant, ownerId, uncertaintyGrams: parts[index]!, wholeGrams: whole }))
}

/** Each owner's part of a cylinder's uncertainty, by share, and what they make together. Rounding: up to the whole gram. */
export function partsOf(uncertaintyGrams: number, shares: readonly Share[]): { parts: number[], whole: number } {
  const total = sum(shares)
  const parts = shares.map(({ grams }) => Math.ceil(total > 0 ? uncertaintyGrams * grams / total : uncertaintyGrams / shares.length))
  return { parts, whole: parts.reduce((all, part) => all + part, 0) }
}

function book(turn: Turn, cause: MovementCause, refrigerant: string | null, ownerId: string | null, grams: number): void {
  const { event, movements, state, at, apart } = turn
  if (grams === 0 || !state.contents.inStock) return
  movements.push({
    eventId: event.id, ordinal: movements.length, cause, refrigerant, ownerId, grams, at, apart,
  })
}

function add(shares: readonly Share[], parts: readonly Share[]): Share[] {
  const sums = shares.map(share => ({ ...share }))
  for (const part of parts) {
    const mine = sums.find(share => share.ownerId === part.ownerId)
    if (mine) mine.grams += part.grams
    else sums.push({ ...part })
  }
  return sums
}

// An owner whose last gram went out has nothing in it any more; where all is out the names stay with the heel.
function prune(shares: Share[]): Share[] {
  return sum(shares) > 0 ? shares.filter(share => share.grams !== 0) : shares
}

function sum(shares: readonly Share[]): number {
  return shares.reduce((total, share) => total + share.grams, 0)
}
