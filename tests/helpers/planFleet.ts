import fc from 'fast-check'
import { anyStory } from '~~/tests/helpers/custodyArbitraries'
import { CUSTOMER, did, filled, kg, recorded, registered, SHOP, STAMP, VAN, VIEW_CONTEXT, type Told } from '~~/tests/helpers/custody'
import type { AnyRecordedEvent } from '~~/utils/custody/event'
import { fold } from '~~/utils/custody/fold'
import { view, type ViewContext } from '~~/utils/custody/view'
import type { PlanCylinder } from '~~/utils/plan/bars'

/** The id of the nth cylinder of a fleet, from 0. */
export function cylinderId(index: number): string {
  return `0198f000-0000-7000-a000-${String(index).padStart(12, '0')}`
}

/** A story as the log of the nth cylinder of a fleet holds it. */
export function logOf(index: number, story: readonly Told[]): AnyRecordedEvent[] {
  return recorded(...story).map(event => ({ ...event, id: event.id.replace('-9000-', `-9${String(index).padStart(3, '0')}-`), cylinderId: cylinderId(index) }))
}

/** A cylinder as a plan looks at it, from its log. */
export function planCylinder(log: readonly AnyRecordedEvent[], refrigerants: readonly string[], changes: Partial<ViewContext> = {}): PlanCylinder {
  const { state } = fold(log, VIEW_CONTEXT)
  const asked = (askedRefrigerant: string | null) => view(state, { ...VIEW_CONTEXT, ...changes, askedRefrigerant })
  return { view: asked(null), asked: state.contents.nothingInIt ? new Map(refrigerants.map(name => [name, asked(name)])) : new Map(), siteId: state.placeId, standsOn: null }
}

/** The first of several far more often than any other, so that many can be brought together. */
function mostly<T>(usual: T, ...others: T[]): fc.Arbitrary<T> {
  return fc.oneof({ weight: 7, arbitrary: fc.constant(usual) }, { weight: 1, arbitrary: fc.constantFrom(...others) })
}

/** Cylinders as a shop has them: most hold one of two refrigerants, in good order; some stand elsewhere, are a customer's, overdue, or empty. */
const ordinary: fc.Arbitrary<Told[]> = fc.record({
  refrigerant: mostly('R-22', 'R-410A'),
  condition: mostly<'suspect' | 'burnt' | 'clean'>('suspect', 'burnt', 'clean'),
  grossKg: fc.integer({ min: 1150, max: 2550 }).map(hundredths => hundredths / 100),
  placeId: mostly(SHOP, VAN),
  ownerOfRefrigerantId: mostly(undefined, CUSTOMER),
  madeMonth: mostly('2024-03', '2019-03'),
  isEmpty: mostly(false, true),
}).map(({ refrigerant, condition, grossKg, placeId, ownerOfRefrigerantId, madeMonth, isEmpty }) => [
  registered({ stamp: { ...STAMP, madeMonth } }, { placeId }),
  ...(isEmpty ? [] : [filled(refrigerant, grossKg, { condition, grossBefore: kg(12), ownerOfRefrigerantId })]),
])

/** Of a cylinder to which anything happened, and which then came to the shop with something in it. */
const strange: fc.Arbitrary<Told[]> = anyStory.map(story => [...story, did('moved', { toPlaceId: SHOP })])

/** The logs of a fleet: mostly ordinary cylinders, some with any life behind them. */
export const anyFleet: fc.Arbitrary<AnyRecordedEvent[][]> = fc.array(fc.oneof({ weight: 4, arbitrary: ordinary }, { weight: 1, arbitrary: strange }), { minLength: 7, maxLength: 12, size: 'max' })
  .map(stories => stories.map((story, index) => logOf(index, story)))
