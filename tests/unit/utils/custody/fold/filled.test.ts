import { describe, expect, it } from 'vitest'
import {
  codes, contentsAfter, CUSTOMER, DAY, did, filled, kg, lastFindings, lastMovements, registered, SHIPMENT, STAMP, START, SUPPLIER, viewAfter, weighed,
} from '~~/tests/helpers/custody'
import { ceilToDivision, floorToDivision, type MassReading } from '~~/utils/quantity/mass'

const holding = (refrigerant: string, grossKg = 15) => registered({ contents: { refrigerant, condition: 'clean' }, gross: kg(grossKg) })

describe('a fill into an evacuated cylinder', () => {
  it('makes it hold this refrigerant, clean where nothing else was said', () => {
    const story = [registered(), filled('R-22', 20)]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: 'R-22', condition: 'clean', netGrams: 8000, nothingInIt: false, evacuated: false })
    expect(lastMovements(...story)).toEqual(['recovered R-22 8000'])
    expect(lastFindings(...story)).toEqual([])
    expect(viewAfter(story).capacity).toMatchObject({ fillLimitGrams: 16_000, stopWeightGrams: 28_000, roomGrams: 8000, refusals: [], governingRule: 'water-weight' })
  })

  it('keeps the word that was said of it', () => {
    expect(contentsAfter(registered(), filled('R-22', 20, { condition: 'suspect' })).condition).toBe('suspect')
  })

  it('counts what the scale showed before as a weighing, and the rest as recovered', () => {
    expect(lastMovements(registered(), filled('R-22', 20, { grossBefore: kg(12.04) }))).toEqual(['weighing R-22 40', 'recovered R-22 7960'])
  })

  it('takes an unnamed gas alone, without a stop', () => {
    const shown = viewAfter([registered(), filled(null, 15)])
    expect(shown.contents).toMatchObject({ refrigerant: null, condition: 'unknown', netGrams: 3000 })
    expect(codes(shown)).not.toContain('unknown-onto-known')
    expect(shown.capacity).toMatchObject({ stopWeightGrams: null, missing: ['refrigerant'] })
  })

  it('found heavier than its tare before the fill is a fill onto something unknown', () => {
    const story = [registered(), filled('R-22', 20, { grossBefore: kg(13) })]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: null, condition: 'unknown', netGrams: 8000 })
    expect(lastFindings(...story)).toEqual(['unknown-onto-known'])
    expect(lastMovements(...story)).toEqual(['weighing ? 1000', 'recovered R-22 7000', 'renamed R-22 -7000', 'renamed ? 7000'])
  })
})

describe('a fill onto the same refrigerant', () => {
  it('keeps its name and adds to it', () => {
    expect(contentsAfter(holding('R-22'), filled('R-22', 20))).toMatchObject({ refrigerant: 'R-22', condition: 'clean', netGrams: 8000 })
    expect(lastMovements(holding('R-22'), filled('R-22', 20, { grossBefore: kg(14.9) }))).toEqual(['weighing R-22 -100', 'recovered R-22 5100'])
  })

  it('takes the worse of both words', () => {
    expect(contentsAfter(holding('R-22'), filled('R-22', 20, { condition: 'suspect' })).condition).toBe('suspect')
    expect(contentsAfter(holding('R-22'), filled('R-22', 17, { condition: 'suspect' }), filled('R-22', 20, { condition: 'clean' })).condition).toBe('suspect')
  })

  it('leaves it burnt once it was, and then holds it to the oily limit', () => {
    const story = [holding('R-22'), filled('R-22', 17, { condition: 'burnt' }), filled('R-22', 18, { condition: 'clean' })]
    const shown = viewAfter(story)
    expect(shown.contents.burnt).toBe(true)
    // 0.69 x 20.0192 L x 1.0823 kg/L of R-22 at 50 C = 14.950 kg
    expect(shown.capacity).toMatchObject({ governingRule: 'oily', fillLimitGrams: 14_950 })
  })
})

describe('a fill with a second refrigerant', () => {
  it('mixes what is in it, and stops until a deep vacuum', () => {
    const story = [holding('R-22'), filled('R-134a', 20)]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: null, condition: 'mixed', netGrams: 8000 })
    expect(lastFindings(...story)).toContain('second-refrigerant')
    const shown = viewAfter(story)
    expect(shown.capacity.refusals.map(({ code }) => code)).toEqual(['second-refrigerant'])
    expect(shown.capacity.stopWeightGrams).toBeNull()
    expect(codes(viewAfter([...story, did('emptied', { vacuum: { microns: 900 } })]))).not.toContain('second-refrigerant')
  })

  it('is booked under the name it came with and renamed at once', () => {
    expect(lastMovements(holding('R-22'), filled('R-134a', 20))).toEqual([
      'renamed R-22 -3000', 'renamed ? 3000', 'recovered R-134a 5000', 'renamed R-134a -5000', 'renamed ? 5000',
    ])
  })

  it('at the tare is taken by its name, but suspect and stopped, for the first one was never evacuated', () => {
    const story = [holding('R-22'), filled('R-134a', 20, { grossBefore: kg(12) })]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: 'R-134a', condition: 'suspect', netGrams: 8000 })
    expect(lastFindings(...story)).toContain('second-refrigerant')
  })

  it('after the reclaimer has taken the first is the same', () => {
    const back = [
      holding('R-22'), did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(15) }), did('reclaimed', { shipmentId: SHIPMENT }),
      did('returned', { fromFirmId: SUPPLIER, gross: kg(12) }),
    ]
    expect(contentsAfter(...back).nothingInIt).toBe(true)
    expect(contentsAfter(...back, filled('R-134a', 20))).toMatchObject({ refrigerant: 'R-134a', condition: 'suspect' })
    expect(lastFindings(...back, filled('R-134a', 20))).toContain('second-refrigerant')
    expect(lastFindings(...back, filled('R-22', 20))).toEqual([])
  })

  it('is refused beforehand where the first one was taken out but never evacuated', () => {
    const back = [
      holding('R-22'), did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(15) }), did('reclaimed', { shipmentId: SHIPMENT }),
      did('returned', { fromFirmId: SUPPLIER, gross: kg(12) }),
    ]
    const asked = (refrigerant: string, more: Parameters<typeof viewAfter>[0] = []) => viewAfter([...back, ...more], { askedRefrigerant: refrigerant }).capacity
    expect(asked('R-134a')).toMatchObject({ refusals: [{ code: 'second-refrigerant', severity: 'stop' }], stopWeightGrams: null, roomGrams: null })
    expect(asked('R-22')).toMatchObject({ refusals: [], stopWeightGrams: 28_000 })
    expect(asked('R-134a', [did('emptied', { vacuum: { microns: 500 } })])).toMatchObject({ refusals: [], stopWeightGrams: 28_000 })
  })

  it('at the tare of what was registered as a mixture leaves its own name suspect, and stopped for what else was in it', () => {
    const story = [registered({ contents: { refrigerant: 'R-22', condition: 'mixed' }, gross: kg(15) }), filled('R-22', 20, { grossBefore: kg(12) })]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: 'R-22', condition: 'suspect' })
    expect(lastFindings(...story)).toContain('second-refrigerant')
    expect(viewAfter(story).capacity).toMatchObject({ stopWeightGrams: null, roomGrams: null })
  })

  it('is none after a deep vacuum', () => {
    const story = [holding('R-22'), did('emptied', { vacuum: { microns: 500 } }), filled('R-134a', 20)]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: 'R-134a', condition: 'clean' })
    expect(lastFindings(...story)).toEqual([])
  })

  it('onto a mixture leaves a mixture, without another finding', () => {
    const story = [holding('R-22'), filled('R-134a', 17), filled('R-22', 18)]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: null, condition: 'mixed' })
    expect(lastFindings(...story)).not.toContain('second-refrigerant')
  })
})

describe('a fill of something unknown', () => {
  it('onto a known refrigerant, or the other way round, leaves nobody knowing', () => {
    const unknownOnto = [holding('R-22'), filled(null, 20)]
    const knownOnto = [registered({ contents: 'unknown', gross: kg(15) }), filled('R-22', 20)]
    for (const story of [unknownOnto, knownOnto]) {
      expect(contentsAfter(...story)).toMatchObject({ refrigerant: null, condition: 'unknown' })
      expect(lastFindings(...story)).toContain('unknown-onto-known')
    }
  })

  it('onto something unknown stays unknown, without a finding', () => {
    const story = [registered({ contents: 'unknown', gross: kg(15) }), filled(null, 20)]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: null, condition: 'unknown' })
    expect(lastFindings(...story)).toEqual([])
  })

  it('onto nothing but the traces of a known one is a stop', () => {
    const story = [holding('R-22'), filled(null, 20, { grossBefore: kg(12) })]
    expect(lastFindings(...story)).toContain('unknown-onto-known')
  })
})

describe('the amount recovered', () => {
  it('is not known where nobody knows the weight before; the net enters as an opening', () => {
    const story = [registered({ contents: { refrigerant: 'R-22', condition: 'clean' } }), filled('R-22', 20)]
    expect(lastMovements(...story)).toEqual(['opening R-22 8000'])
    expect(lastFindings(...story)).toContain('weight-not-known')
  })

  it('belongs to the owner named, beside the firm\'s own', () => {
    const story = [holding('R-22'), filled('R-22', 20, { ownerOfRefrigerantId: CUSTOMER })]
    expect(lastMovements(...story)).toEqual(['recovered R-22 5000 f1'])
    const shown = viewAfter(story)
    expect(shown.contents.owners).toEqual([{ ownerId: null, grams: 3000 }, { ownerId: CUSTOMER, grams: 5000 }])
    expect(codes(shown)).toContain('two-owners')
  })

  it('is never negative: less after than before is a weighing to look at again', () => {
    const story = [holding('R-22'), filled('R-22', 14)]
    expect(lastMovements(...story)).toEqual(['weighing R-22 -1000'])
    expect(lastFindings(...story)).toContain('weigh-again')
  })

  it('is unknown below the tare', () => {
    const story = [holding('R-22'), filled('R-22', 11)]
    expect(contentsAfter(...story)).toMatchObject({ netGrams: null, refrigerant: 'R-22' })
    expect(lastMovements(...story)).toEqual(['weighing R-22 -3000'])
  })
})

describe('an overfilled cylinder', () => {
  it('is one above its limit, not at it; at nine tenths it is nearly full', () => {
    const after = (grossKg: number) => codes(viewAfter([registered(), filled('R-22', grossKg)]))
    expect(after(26.399)).toEqual([])
    expect(after(26.4)).toEqual(['nearly-full'])
    expect(after(28)).toEqual(['nearly-full'])
    expect(after(28.001)).toEqual(['overfill'])
  })

  it('is not one filled to the very stop weight that was shown', () => {
    // WC 24.0 lb, TW 15.0 lb: 19.2 + 15.0 = 34.2 lb. In whole grams 15,513 - 6,804 = 8,709, a hair above 19.2 lb = 8,708.97 g.
    const inPounds = registered({ stamp: { ...STAMP, tareWeight: { unit: 'lb', value: 15 }, waterCapacity: { unit: 'lb', value: 24 } } })
    const filledTo = (value: number) => viewAfter([inPounds, filled('R-22', 0, { grossAfter: { unit: 'lb', value } })])
    expect(codes(filledTo(34.2))).toEqual(['nearly-full'])
    expect(filledTo(34.2).capacity.roomGrams).toBe(0)
    expect(filledTo(34.2).findings[0]?.text.replaceAll('\u00A0', ' ')).toContain('room for 0.0 lb (0.00 kg)')
    expect(codes(filledTo(34.3))).toEqual(['overfill'])
    expect(codes(viewAfter([inPounds, filled('R-22', 0, { grossAfter: { unit: 'lb', value: 34.2 } }), did('lost', { cause: 'hose' })]))).toEqual(['weight-not-known'])
  })

  it.each(['lb', 'lb-oz', 'kg'] as const)('is never one at the stop weight in %s, and always one a division above', (unit) => {
    for (let tenths = 200; tenths < 600; tenths += 7) {
      const stamp = { ...STAMP, tareWeight: { unit: 'lb' as const, value: (tenths % 97 + 100) / 10 }, waterCapacity: { unit: 'lb' as const, value: tenths / 10 } }
      for (const name of ['R-22', 'R-32']) {
        const stop = viewAfter([registered({ stamp })], { askedRefrigerant: name }).capacity.exactStopWeightGrams!
        const after = (grossAfter: MassReading) => codes(viewAfter([registered({ stamp }), filled(name, 0, { grossAfter })]))
        expect(after(floorToDivision(stop, unit))).toEqual(['nearly-full'])
        expect(after(ceilToDivision(stop + 1, unit))).toEqual(['overfill'])
      }
    }
  })

  it('is recorded as a fact, with its excess and negative room', () => {
    const story = [registered(), filled('R-22', 30)]
    expect(lastFindings(...story)).toEqual(['overfill'])
    const shown = viewAfter(story)
    expect(shown.capacity).toMatchObject({ roomGrams: -2000, stopWeightGrams: 28_000, refusals: [] })
    expect(shown.findings[0]).toMatchObject({ code: 'overfill', severity: 'stop', since: '2026-07-01T18:00:00.000Z' })
    // 2 kg are 4.409 lb: an excess is rounded up.
    expect(shown.findings[0]?.text.replaceAll('\u00A0', ' ')).toContain('Overfilled by 4.5 lb (2.00 kg)')
  })

  it('stays so when its weight is lost, until a weight clears it', () => {
    const leaking = [registered(), filled('R-22', 30), did('lost', { cause: 'hose' })]
    expect(codes(viewAfter(leaking))).toEqual(['overfill', 'weight-not-known'])
    expect(codes(viewAfter([...leaking, weighed(27)]))).toEqual(['nearly-full'])
  })

  it('stays so when its refrigerant becomes unknown, by the limit of what is known to be in it', () => {
    const story = [registered(), filled('R-22', 27), filled('R-134a', 29)]
    expect(codes(viewAfter(story))).toEqual(['overfill', 'second-refrigerant'])
    expect(codes(viewAfter([...story, weighed(27)]))).toEqual(['second-refrigerant'])
  })

  it('once burnt is judged by the oily limit', () => {
    // 14.950 kg, as above.
    const burntTo = (grossKg: number) => codes(viewAfter([registered(), filled('R-22', grossKg, { condition: 'burnt' })]))
    expect(burntTo(26.95)).toEqual(['nearly-full'])
    expect(burntTo(26.951)).toEqual(['overfill'])
  })

  it('of a mixture is judged by the lowest limit of all that is known to be in it', () => {
    // R-454B at 131 F weighs 0.8299 kg/L: 0.95 x 20.0192 L x 0.8299 = 15.783 kg; R-22 may be 16 kg.
    const mixedTo = (grossKg: number) => codes(viewAfter([registered(), filled('R-22', 20), filled('R-454B', grossKg)]))
    expect(mixedTo(27.78)).not.toContain('overfill')
    expect(mixedTo(27.79)).toContain('overfill')
  })

  it('is judged by what was in it before where the catalogue does not know what came', () => {
    const story = [registered(), filled('R-22', 29), filled('R-9999', 29.5, { grossBefore: kg(12) })]
    expect(codes(viewAfter(story))).toContain('overfill')
    expect(codes(viewAfter([...story, weighed(27)]))).not.toContain('overfill')
  })

  it('is not one that was evacuated since and whose weight is not known', () => {
    const story = [registered(), filled('R-22', 29), did('emptied', { vacuum: { microns: 500 }, grossAfter: kg(11.5) }), filled('R-22', 11.5)]
    expect(codes(viewAfter(story))).toEqual(['weight-not-known'])
  })

  it('is one above today\'s ceiling, whatever the rule it was filled by', () => {
    const policyAt = (ms: number) => ({ shareThousandths: 800, ceilingThousandths: ms < START + 2 * DAY ? 950 : 700, options: { liquid130F: false, unRatio: false } })
    const later = { policyAt, policyNow: policyAt(START + 3 * DAY), nowMs: START + 3 * DAY }
    // 0.70 x 20.0192 L x 1.0572 kg/L of R-22 at 131 F = 14.815 kg
    expect(codes(viewAfter([registered(), filled('R-22', 26.81)], later))).toEqual(['nearly-full'])
    expect(codes(viewAfter([registered(), filled('R-22', 26.82)], later))).toEqual(['overfill'])
  })

  it('is forgiven a rule that became stricter after the fill, but shows that there is no room', () => {
    const policyAt = (ms: number) => ({ shareThousandths: ms < START + 2 * DAY ? 800 : 700, ceilingThousandths: 950, options: { liquid130F: false, unRatio: false } })
    const later = { policyAt, policyNow: policyAt(START + 3 * DAY), nowMs: START + 3 * DAY }
    const shown = viewAfter([registered(), filled('R-22', 27)], later)
    expect(codes(shown)).toEqual(['nearly-full'])
    expect(shown.capacity).toMatchObject({ fillLimitGrams: 14_000, roomGrams: -1000 })
    // One that was filled after the change has no such excuse.
    expect(codes(viewAfter([registered(), filled('R-22', 27, {}, { occurredAt: START + 2 * DAY })], later))).toEqual(['overfill'])
  })
})

describe('a fill that should not have been', () => {
  it('of an overdue cylinder is recorded with a stop', () => {
    const old = { ...STAMP, madeMonth: '2019-03' }
    const story = [registered({ stamp: old }), filled('R-22', 20)]
    expect(lastFindings(...story)).toEqual(['retest-overdue'])
    const shown = viewAfter(story)
    expect(shown.findings[0]).toMatchObject({ code: 'retest-overdue', severity: 'caution' })
    expect(shown.capacity.refusals[0]).toMatchObject({ code: 'retest-overdue', severity: 'stop' })
    expect(shown.capacity).toMatchObject({ fillLimitGrams: 16_000, stopWeightGrams: null, roomGrams: null })
  })

  it('of a cylinder without a test date is recorded with a stop', () => {
    expect(lastFindings(registered({ stamp: { ...STAMP, madeMonth: null } }), filled('R-22', 20))).toEqual(['retest-unknown'])
  })

  it('with a flammable into a cylinder not marked for it is recorded with a stop that then stands', () => {
    const story = [registered({ stamp: { ...STAMP, flammableMarked: false } }), filled('R-454B', 15)]
    expect(lastFindings(...story)).toEqual(['not-marked-flammable'])
    expect(codes(viewAfter(story))).toEqual(['not-marked-flammable'])
  })

  it('keeps its stops when another refrigerant takes away the name of what is in it', () => {
    const unmarked = registered({ stamp: { ...STAMP, flammableMarked: false, servicePressurePsig: 350 } })
    // R-410A may reach 490 psig at 131 F; 5/4 of 350 psig is 437 psig.
    expect(codes(viewAfter([unmarked, filled('R-454B', 14), filled('R-410A', 15), filled('R-22', 16)])))
      .toEqual(['pressure-class', 'not-marked-flammable', 'second-refrigerant'])
    expect(codes(viewAfter([unmarked, filled('R-454B', 14), filled('R-22', 16), did('emptied', { vacuum: { microns: 500 } })]))).toEqual([])
  })

  it('of a DOT-39 is a stop of the cylinder from then on, not before', () => {
    const stamp = { ...STAMP, spec: 'DOT-39' }
    const bought = registered({ stamp, contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(15) })
    expect(codes(viewAfter([bought]))).not.toContain('not-refillable')
    expect(viewAfter([bought]).capacity.refusals.map(({ code }) => code)).toContain('not-refillable')
    expect(codes(viewAfter([bought, filled('R-22', 16)]))).toContain('not-refillable')
  })

  it('with the system’s own compressor of more than 15 lb is a caution, for so much came out', () => {
    // 15 lb = 6,803.9 g.
    const own = (grossKg: number, method = 'own-compressor') => lastFindings(registered(), filled('R-22', grossKg, { grossBefore: kg(12), method }))
    expect(own(18.804)).toEqual([])
    expect(own(18.805)).toEqual(['system-dependent-limit'])
    expect(own(20, 'fixed-pump-out')).toEqual([])
    expect(own(20, 'machine')).toEqual([])
    expect(codes(viewAfter([registered(), filled('R-22', 20, { method: 'own-compressor' })]))).not.toContain('system-dependent-limit')
  })

  it('with the system’s own compressor says nothing of an amount that no weight tells', () => {
    const unknown = registered({ contents: 'unknown' })
    expect(lastFindings(unknown, filled('R-22', 20, { method: 'own-compressor' }))).not.toContain('system-dependent-limit')
  })

  it('without a look at the outside says so', () => {
    expect(lastFindings(registered(), did('filled', { refrigerant: 'R-22', grossAfter: kg(20) }))).toEqual(['look-before-fill'])
  })
})
