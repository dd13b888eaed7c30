import type { PackedCylinder } from '../contract/kit'
import type { CylinderState } from '../custody/state'
import { squeezed } from '../fleet/stampHits'
import { unpackCylinder } from './packCylinder'

/** A cylinder as a phone keeps it: packed, and beside it what it is looked up by. What is missing is left out, for the store's sake. */
export interface KitEntry {
  id: string
  packed: PackedCylinder
  /** Every label code that opens it, those that were replaced too. */
  codes: string[]
  /** Its stamped serial from its end to its beginning, as it is searched by. */
  tail?: string
  placeId?: string
  holderId?: string
  /** Cylinders that it names in what happened between two. */
  names: string[]
}

/** What a phone keeps of a packed cylinder. */
export function kitEntry(packed: PackedCylinder): KitEntry {
  const { id, labels, stamp, placeId, holderId, halves } = unpackCylinder(packed)
  return {
    id,
    packed,
    codes: labels.map(({ code }) => code),
    ...stamp?.serial ? { tail: tailOf(stamp.serial) } : {},
    ...placeId === null ? {} : { placeId },
    ...holderId === null ? {} : { holderId },
    names: [...new Set(halves.map(({ otherId }) => otherId))],
  }
}

/** The characters of a stamp from their end to their beginning: what ends alike begins alike. */
export function tailOf(serial: string): string {
  return [...squeezed(serial)].reverse().join('')
}

/** Cylinders and the codes on them, as far as it matters which has a code. */
type Labelled = Pick<CylinderState, 'id' | 'labels'>

/** Of the cylinders that have had a code, the one that it opens: which had it first. */
export function ownerOfCode<C extends Labelled>(code: string, claiming: readonly C[]): C | null {
  const since = ({ labels }: C) => labels.find(label => label.code === code)?.firstAt ?? Infinity
  return [...claiming].filter(one => since(one) < Infinity).sort((a, b) => since(a) - since(b) || (a.id < b.id ? -1 : 1))[0] ?? null
}

/**
 * Codes of a cylinder that are on another one too.
 *
 * A code belongs to the cylinder that had it first. Once a new label has taken its place on the other, it is on one again.
 */
export function codesOnTwo(state: Labelled, claiming: readonly Labelled[]): Set<string> {
  const others = claiming.filter(({ id }) => id !== state.id)
  return new Set(state.labels.map(({ code }) => code).filter((code) => {
    const sharing = others.filter(({ labels }) => labels.some(label => label.code === code))
    const owner = ownerOfCode(code, [state, ...sharing])
    const isOff = ({ labels }: Labelled) => labels.find(label => label.code === code)?.replacedAt !== undefined
    return sharing.some(other => !isOff(owner === state ? other : state))
  }))
}
