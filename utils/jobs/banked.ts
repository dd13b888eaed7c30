import type { BankedCylinder, BankedIn } from '../contract/banked'
import { partsOf } from '../custody/fold/ledger'
import type { CylinderState } from '../custody/state'

/** One change of what is theirs in a cylinder. */
export interface OwnerMovement { cylinderId: string, at: number, grams: number }

/**
 * What is banked in a customer's name, by refrigerant and condition, the most of it first.
 *
 * Rounding: uncertainties up to the whole gram, together as the root of the sum of their squares.
 * @param movements of this owner, in order of effect.
 */
export function banked(ownerId: string, states: readonly CylinderState[], movements: readonly OwnerMovement[]): BankedIn[] {
  const since = sinceWhen(movements)
  const groups = new Map<string, BankedIn>()
  for (const state of states) {
    const cylinder = bankedIn(state, ownerId, since.get(state.id) ?? null)
    if (!cylinder) continue
    const { refrigerant, condition } = state.contents
    const key = JSON.stringify([refrigerant, condition])
    const group = groups.get(key) ?? { refrigerant, condition, grams: null, uncertaintyGrams: null, notKnown: 0, cylinders: [] }
    groups.set(key, { ...group, cylinders: [...group.cylinders, cylinder] })
  }
  return [...groups.values()].map(summed).sort((a, b) => (b.grams ?? 0) - (a.grams ?? 0))
}

function bankedIn({ id, labelCode, stamp, contents }: CylinderState, ownerId: string, sinceMs: number | null): BankedCylinder | null {
  const { shares, netGrams, uncertaintyGrams } = contents
  const index = shares.findIndex(share => share.ownerId === ownerId)
  const mine = shares[index]
  if (!mine || !contents.inStock || contents.nothingInIt) return null
  return {
    id, labelCode,
    serial: stamp?.serial ?? null,
    grams: netGrams === null ? null : mine.grams,
    uncertaintyGrams: netGrams === null || uncertaintyGrams === null ? null : partsOf(uncertaintyGrams, shares).parts[index]!,
    isShared: shares.some(share => share.ownerId !== ownerId && (netGrams === null || share.grams > 0)),
    since: sinceMs === null ? null : new Date(sinceMs).toISOString(),
  }
}

function summed(group: BankedIn): BankedIn {
  const known = group.cylinders.flatMap(({ grams }) => grams === null ? [] : [grams])
  const squares = group.cylinders.reduce((sum, { uncertaintyGrams }) => sum + (uncertaintyGrams ?? 0) ** 2, 0)
  return {
    ...group,
    grams: known.length === 0 ? null : known.reduce((sum, grams) => sum + grams, 0),
    uncertaintyGrams: known.length === 0 ? null : Math.ceil(Math.sqrt(squares)),
    notKnown: group.cylinders.length - known.length,
  }
}

// What came to nothing in between began anew.
function sinceWhen(movements: readonly OwnerMovement[]): Map<string, number> {
  const held = new Map<string, number>()
  const since = new Map<string, number>()
  for (const { cylinderId, at, grams } of movements) {
    const before = held.get(cylinderId) ?? 0
    const after = before + grams
    held.set(cylinderId, after)
    if (before <= 0 && after > 0) since.set(cylinderId, at)
    if (after <= 0) since.delete(cylinderId)
  }
  return since
}

/**
 * A customer's part of what was credited for a cylinder. Rounding: to the nearest cent, halves away from zero.
 *
 * @example creditOf(1001, { grams: 1, wholeGrams: 2 }) // 501
 */
export function creditOf(cents: number, { grams, wholeGrams }: { grams: number, wholeGrams: number }): number {
  if (wholeGrams <= 0) return 0
  const size = Math.round(Math.abs(cents) * grams / wholeGrams)
  return cents < 0 && size !== 0 ? -size : size
}
