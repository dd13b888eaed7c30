import { describe, expect, it } from 'vitest'
import { corrected, did, filled, FOLD_CONTEXT, HOUR, idOf, kg, recorded, registered, SHOP, START, TECHNICIAN, VAN, weighed } from '~~/tests/helpers/custody'
import { foldAsItStood, type Past } from '~~/utils/custody/asItStood'

// Registered at hour 0 with 12 kg tare, filled to 20 kg at 1, moved at 2; a weight of hour 1.5 arrives at hour 9, and at
// hour 10 the fill is found to have been to 22 kg.
const EVENTS = recorded(
  registered({ gross: kg(12) }),
  filled('R-22', 20),
  did('moved', { toPlaceId: VAN, toHolderId: TECHNICIAN }),
  weighed(19.5, { occurredAt: START + 1.5 * HOUR, recordedAt: START + 9 * HOUR }),
  corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(22), looked: true }, { occurredAt: START + 10 * HOUR }),
)

const at = (hours: number) => START + hours * HOUR
const stood = (past: Partial<Past>) => foldAsItStood(EVENTS, FOLD_CONTEXT, { asOf: null, knownAt: null, ...past })
const net = (past: Partial<Past>) => stood(past)?.state.contents.netGrams

describe('a cylinder as it stood', () => {
  it('goes by what had happened, with all that is known of it now', () => {
    expect(net({ asOf: at(1) - 1 })).toBe(0)
    expect(net({ asOf: at(1) })).toBe(10_000)
    expect(net({ asOf: at(1.5) })).toBe(7_500)
    expect([stood({ asOf: at(2) - 1 }), stood({ asOf: at(2) })].map(each => each!.state.placeId)).toEqual([SHOP, VAN])
  })

  it('goes by what was known, late arrivals and corrections left out until they came', () => {
    expect(net({ knownAt: at(9) - 1 })).toBe(8_000)
    expect(net({ knownAt: at(9) })).toBe(7_500)
    expect(net({ asOf: at(1.2), knownAt: at(9) })).toBe(8_000)
    expect(net({ asOf: at(1.2), knownAt: at(10) })).toBe(10_000)
  })

  it('has no lines, no last event and no movements of what came later', () => {
    const then = stood({ asOf: at(1) })!
    expect(then.steps.map(({ eventId }) => eventId)).toEqual([idOf(0), idOf(1)])
    expect(then.state.lastEventAt).toBe(at(1))
    expect(then.movements.map(({ grams }) => grams)).toEqual([10_000])
  })

  it('was not there before anything had happened or was known', () => {
    expect(stood({ asOf: START - 1 })).toBeNull()
    expect(stood({ knownAt: START - 1 })).toBeNull()
  })

  it('begins with its registration once anything has happened, though that was entered later', () => {
    const late = recorded(weighed(15), registered({ gross: kg(12) }))
    const then = foldAsItStood(late, FOLD_CONTEXT, { asOf: START, knownAt: null })!
    expect([then.state.contents.netGrams, then.state.lastEventAt, then.state.stamp?.serial]).toEqual([3_000, START, 'A1001'])
    expect(foldAsItStood(late, FOLD_CONTEXT, { asOf: START - 1, knownAt: null })).toBeNull()
    expect(foldAsItStood(late, FOLD_CONTEXT, { asOf: null, knownAt: START })!.state.stamp).toBeNull()
  })
})
