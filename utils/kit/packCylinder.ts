import type { PackedCylinder } from '../contract/kit'
import { exactGrams } from '../quantity/mass'
import { initialState, type ContentsState, type CylinderState } from '../custody/state'
import { packBy, unpackBy, type Packed, type PackParts } from './packParts'

/** The number of this form: raised with each change of it, so that a phone with an older application leaves the new form alone. */
export const KIT_FORM = 1

const CONTENTS: PackParts<ContentsState> = {
  refrigerant: { as: 'r', usual: () => null },
  netGrams: { as: 'n', usual: () => null },
  nothingInIt: { as: 'z', usual: () => false },
  evacuated: { as: 'e', usual: ({ nothingInIt }) => nothingInIt },
  condition: { as: 'c', usual: () => 'clean' },
  burnt: { as: 'b', usual: ({ condition }) => condition === 'burnt' },
  inStock: { as: 's', usual: () => true },
  basis: { as: 'w', usual: ({ netGrams }) => netGrams === null ? 'unknown' : 'weighed' },
  grossGrams: { as: 'g', usual: () => null },
  uncertaintyGrams: { as: 'u', usual: () => null },
  asOf: { as: 'a', usual: () => null },
  shares: { as: 'o', usual: ({ nothingInIt, netGrams }) => nothingInIt ? [] : [{ ownerId: null, grams: netGrams ?? 0 }] },
  knownSinceVacuum: { as: 'k', usual: ({ refrigerant }) => refrigerant === null ? [] : [refrigerant] },
  lastKnownNetGrams: { as: 'l', usual: ({ nothingInIt, netGrams }) => nothingInIt ? null : netGrams },
  backFromReclaim: { as: 'f', usual: () => false },
}

const NOTHING_KNOWN = initialState('')

/** Everything but the contents, which are packed by a table of their own. */
const CYLINDER: PackParts<Omit<CylinderState, 'contents'>> = {
  id: { as: 'i', usual: () => '' },
  version: { as: 'v', usual: () => 1 },
  firstEventAt: { as: 'a', usual: () => null },
  registeredAt: { as: 'r', usual: ({ firstEventAt }) => firstEventAt },
  lastEventAt: { as: 'z', usual: ({ firstEventAt }) => firstEventAt },
  lastEventKind: { as: 'k', usual: () => 'moved' },
  lastSeenAt: { as: 's', usual: ({ lastEventAt }) => lastEventAt },
  lastPutInAt: { as: 'f', usual: () => null },
  latestAt: { as: 'L', usual: ({ lastEventAt }) => lastEventAt },
  namedEarly: { as: 'N', usual: () => [] },
  stamp: { as: 'p', usual: () => null },
  marks: { as: 'm', usual: () => [] },
  dedicatedTo: { as: 'd', usual: () => null },
  ownership: { as: 'o', usual: () => 'own' },
  ownerId: { as: 'w', usual: () => null },
  tare: {
    as: 't',
    usual: ({ stamp, registeredAt }) => stamp?.tareWeight && registeredAt !== null
      ? { exactGrams: exactGrams(stamp.tareWeight), since: registeredAt, isWeighedAnew: false }
      : null,
  },
  labels: { as: 'l', usual: () => [] },
  labelCode: { as: 'c', usual: ({ labels }) => labels.at(-1)?.code ?? null },
  placeId: { as: 'x', usual: () => null },
  holderId: { as: 'h', usual: () => null },
  away: { as: 'y', usual: () => null },
  missing: { as: 'n', usual: () => null },
  condemnedAt: { as: 'e', usual: () => null },
  retired: { as: 'q', usual: () => null },
  holds: { as: 'u', usual: () => [] },
  hasHeldBurnt: { as: 'b', usual: () => false },
  filledHere: { as: 'j', usual: ({ lastPutInAt }) => lastPutInAt !== null },
  overfilledAt: { as: 'O', usual: () => null },
  standing: { as: 'S', usual: () => [] },
  halves: { as: 'H', usual: () => [] },
  waitsForSignatureOf: { as: 'W', usual: () => [] },
}

/** A cylinder's state in few bytes: what is as usual is left out. {@link unpackCylinder} gives exactly the same state again. */
export function packCylinder(state: CylinderState): PackedCylinder {
  const packed = packBy(CYLINDER, state)
  const contents = packBy(CONTENTS, state.contents)
  return (Object.keys(contents).length === 0 ? packed : { ...packed, g: contents }) as PackedCylinder
}

/** The state that was packed, with its keys in the order in which the fold has them. */
export function unpackCylinder(packed: PackedCylinder): CylinderState {
  const contents = unpackBy(CONTENTS, (packed['g'] ?? {}) as Packed, NOTHING_KNOWN.contents)
  const empty: CylinderState = { ...NOTHING_KNOWN, contents }
  return unpackBy<Omit<CylinderState, 'contents'>>(CYLINDER, packed, empty) as CylinderState
}
