import { describe, expect, it } from 'vitest'
import {
  codes, contentsAfter, CUSTOMER, did, filled, folded, lastFindings, lastMovements, LOT, RECLAIMER_PLACE, registered, SHIPMENT, SUPPLIER,
  SHOP, kg, STAMP, TEST_PLACE, VIEW_CONTEXT, viewAfter, weighed,
} from '~~/tests/helpers/custody'
import type { Condition } from '~~/utils/custody/cylinderView'

const full = [registered(), filled('R-22', 20)]

// R-22 at 80 F: 143.6 psig, 1091.4 kPa absolute (a printed pressure-temperature page). Its slope near there is 2.3 psi/F and
// its figures are good to 0.5 %: with a gauge to 1 psi and a thermometer to 2 F it agrees up to about 6.5 psi above.
const at80F = (psig: number, more: object = {}) => did('checked', {
  method: 'pressure', pressureKPa: psig * 6.894757 + 101.325, temperatureC: 26.667, ...more,
})

function found(refrigerant: string | null, condition: Condition, method: 'identifier' | 'laboratory' = 'identifier') {
  return did('checked', { method, verdict: { refrigerant, condition } })
}

describe('a pressure check', () => {
  it('sets nothing, whatever it shows', () => {
    for (const psig of [0, 143.6, 300]) {
      expect(contentsAfter(...full, at80F(psig))).toEqual(contentsAfter(...full))
      expect(lastMovements(...full, at80F(psig))).toEqual([])
    }
  })

  it('raises a gas excess above what the refrigerant can have, and not within what the instruments may be off', () => {
    expect(lastFindings(...full, at80F(143.6))).toEqual([])
    expect(lastFindings(...full, at80F(148))).toEqual([])
    expect(lastFindings(...full, at80F(152))).toEqual(['gas-excess'])
    expect(lastFindings(...full, at80F(100))).toEqual([])
  })

  it('counts what the instruments are good for, where that is said', () => {
    // 4.4 psi = 30.3 kPa above.
    expect(lastFindings(...full, at80F(148, { gaugeErrorKPa: 1, thermometerErrorC: 0.1 }))).toEqual(['gas-excess'])
    expect(lastFindings(...full, at80F(152, { gaugeErrorKPa: 60 }))).toEqual([])
  })

  it('stands on the barometer: high up the same gauge reading is less', () => {
    // 5,000 ft: 84.3 kPa, 2.5 psi less air than at sea level.
    expect(lastFindings(...full, at80F(152, { barometerKPa: 84.3 }))).toEqual([])
    expect(lastFindings(...full, at80F(155, { barometerKPa: 84.3 }))).toEqual(['gas-excess'])
  })

  it('names no gas, and says what to do', () => {
    const { text, severity } = folded(...full, at80F(163.6)).steps.at(-1)!.findings[0]!
    expect(severity).toBe('caution')
    // 143.6 psig is printed to 0.1 psi.
    expect(text).toMatch(/(19\.9|20\.0|20\.1)\u00A0psi \(13[78]\u00A0kPa\) above what R-22 has/)
    expect(text).toContain('a pressure cannot tell which')
    expect(text).not.toMatch(/nitrogen|hydrocarbon|R-410A/)
  })

  it('compares with the refrigerant that the log has at that moment, and with none where it has none', () => {
    // R-410A stands at 236.5 psig at 80 F.
    expect(lastFindings(registered(), filled('R-410A', 20), at80F(236.5))).toEqual([])
    expect(lastFindings(...full, at80F(236.5))).toEqual(['gas-excess'])
    expect(lastFindings(registered(), filled(null, 20), at80F(236.5))).toEqual([])
    expect(lastFindings(registered(), filled('R-9999', 20), at80F(236.5))).toEqual([])
  })

  it('speaks where the log has nothing in it and the gauge shows more than it may be off', () => {
    expect(lastFindings(registered(), at80F(236.5))).toEqual(['gas-excess'])
    // A gauge is taken as good to 1 psi where nobody says more.
    expect(lastFindings(registered(), at80F(1.1))).toEqual(['gas-excess'])
    expect(lastFindings(registered(), at80F(0.9))).toEqual([])
    expect(lastFindings(registered(), at80F(1.1, { gaugeErrorKPa: 10 }))).toEqual([])
    // A gauge counts from the air that it stands in, high up too.
    expect(lastFindings(registered(), at80F(1.1, { barometerKPa: 84.3 }))).toEqual(['gas-excess'])
    expect(lastFindings(registered(), at80F(-14))).toEqual([])
    const { text } = folded(registered(), at80F(100)).steps.at(-1)!.findings[0]!
    expect(text).toContain('100.0\u00A0psi (689\u00A0kPa) above the air')
    expect(contentsAfter(registered(), at80F(236.5))).toEqual(contentsAfter(registered()))
  })

  it('is kept without a word where the refrigerant has no liquid at that temperature', () => {
    expect(lastFindings(registered(), filled('R-744', 20), did('checked', { method: 'pressure', pressureKPa: 9000, temperatureC: 40 }))).toEqual([])
  })

  it('does not make the finding stand: it is of that moment', () => {
    expect(codes(viewAfter([...full, at80F(200)]))).not.toContain('gas-excess')
  })
})

describe('an analysis', () => {
  it.each(['identifier', 'laboratory'] as const)('by %s sets refrigerant and condition, better or worse', (method) => {
    expect(contentsAfter(...full, found('R-410A', 'suspect', method))).toMatchObject({ refrigerant: 'R-410A', condition: 'suspect' })
    const suspect = [registered(), filled('R-22', 20, { condition: 'suspect' })]
    expect(contentsAfter(...suspect, found('R-22', 'clean', method))).toMatchObject({ refrigerant: 'R-22', condition: 'clean' })
    expect(contentsAfter(...full, found(null, 'mixed', method))).toMatchObject({ refrigerant: null, condition: 'mixed' })
  })

  it('that gives another name books the net out of the one and into the other, owner by owner', () => {
    expect(lastMovements(...full, found('R-410A', 'clean'))).toEqual(['renamed R-22 -8000', 'renamed R-410A 8000'])
    const customers = [registered(), filled('R-22', 20, { ownerOfRefrigerantId: CUSTOMER })]
    expect(lastMovements(...customers, found(null, 'mixed'))).toEqual(['renamed R-22 -8000 f1', 'renamed ? 8000 f1'])
    expect(lastMovements(...full, found('R-22', 'suspect'))).toEqual([])
  })

  it('leaves the weight as it was, known or not', () => {
    expect(contentsAfter(...full, found('R-410A', 'clean'))).toMatchObject({ netGrams: 8000, basis: 'weighed' })
    const unweighed = [registered({ contents: 'unknown' })]
    expect(contentsAfter(...unweighed, found('R-22', 'clean'))).toMatchObject({ refrigerant: 'R-22', netGrams: null })
    expect(lastMovements(...unweighed, found('R-22', 'clean'))).toEqual([])
    // The first weight then enters under the name that was found.
    expect(lastMovements(...unweighed, found('R-22', 'clean'), weighed(20))).toEqual(['opening R-22 8000'])
  })

  it('gives an unknown cylinder its stop weight back', () => {
    const unknown = [registered(), filled(null, 20, { condition: 'unknown' })]
    expect(viewAfter(unknown).capacity.stopWeightGrams).toBeNull()
    expect(viewAfter([...unknown, found('R-22', 'clean')]).capacity.stopWeightGrams).toBe(28_000)
  })

  it('does not unburn it: oil and acid stay in the steel until a deep vacuum', () => {
    const burnt = [registered(), filled('R-22', 20, { condition: 'burnt' })]
    expect(contentsAfter(...burnt, found('R-22', 'clean'))).toMatchObject({ condition: 'clean', burnt: true })
    expect(contentsAfter(...full, found('R-22', 'burnt'), found('R-22', 'clean'))).toMatchObject({ condition: 'clean', burnt: true })
    expect(contentsAfter(...burnt, found('R-22', 'clean'), did('emptied', { vacuum: { microns: 500 } })).burnt).toBe(false)
  })

  it('does not end what stands until a deep vacuum', () => {
    const second = [registered(), filled('R-22', 20), filled('R-134a', 22)]
    expect(codes(viewAfter([...second, found('R-22', 'clean')]))).toContain('second-refrigerant')
    const unknown = [registered(), filled('R-22', 20), filled(null, 22)]
    expect(codes(viewAfter([...unknown, found('R-22', 'clean')]))).toContain('unknown-onto-known')
    expect(viewAfter([...unknown, found('R-22', 'clean')]).capacity.stopWeightGrams).toBeNull()
  })

  it('is remembered until a deep vacuum: what it named is not made way for by an empty scale', () => {
    const wasWrong = [...full, found('R-410A', 'clean'), weighed(12), filled('R-22', 18, { grossBefore: kg(12) })]
    expect(lastFindings(...wasWrong)).toContain('second-refrigerant')
    const sameAgain = [registered(), filled('R-22', 20), found('R-22', 'clean'), weighed(12), filled('R-22', 18, { grossBefore: kg(12) })]
    expect(lastFindings(...sameAgain)).toEqual([])
  })

  it('that finds a gas where nothing was: something is in it, and its weight is not known', () => {
    expect(contentsAfter(registered(), found('R-22', 'suspect'))).toMatchObject({
      nothingInIt: false, evacuated: false, refrigerant: 'R-22', condition: 'suspect', netGrams: null, basis: 'unknown',
    })
    expect(codes(viewAfter([registered(), found('R-22', 'suspect')]))).toContain('weight-not-known')
  })

  it('judges the fill anew by what it is, and ends no overfill by making the refrigerant unknown', () => {
    // 15.5 kg: R-22 may have 0.80 x 20 = 16 kg. R-290 may have less than half of that: its liquid weighs half as much as water.
    const allowed = [registered(), filled('R-22', 27.5)]
    expect(codes(viewAfter(allowed))).not.toContain('overfill')
    expect(codes(viewAfter([...allowed, found('R-290', 'suspect')]))).toContain('overfill')
    expect(lastFindings(...allowed, found('R-290', 'suspect'))).toContain('overfill')
    const overfilled = [registered(), filled('R-22', 29)]
    expect(codes(viewAfter([...overfilled, found(null, 'mixed')]))).toContain('overfill')
  })

  it('speaks against a cylinder that is not made for what was found', () => {
    const plain = registered({ stamp: { ...STAMP, flammableMarked: false } })
    expect(codes(viewAfter([plain, filled('R-22', 20)]))).not.toContain('not-marked-flammable')
    expect(codes(viewAfter([plain, filled('R-22', 20), found('R-290', 'suspect')]))).toContain('not-marked-flammable')
  })
})

describe('a check of a cylinder that is away', () => {
  const gone = [...full, did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(20) }, { placeId: RECLAIMER_PLACE })]

  it('at the cylinder is recorded with a stop, and it stays away', () => {
    expect(lastFindings(...gone, at80F(143.6))).toEqual(['away'])
    expect(lastFindings(...gone, found('R-22', 'clean'))).toEqual(['away'])
    expect(viewAfter([...gone, found('R-22', 'clean')]).lifecycle).toBe('at-reclaim')
    const atTest = [registered(), did('sent-for-test', { lotId: LOT }, { placeId: TEST_PLACE })]
    expect(lastFindings(...atTest, found('R-22', 'suspect'))).toEqual(['away'])
  })

  it('by a laboratory is of its sample: nothing speaks against it, and what is out of stock moves in no book', () => {
    expect(lastFindings(...gone, found('R-410A', 'clean', 'laboratory'))).toEqual([])
    expect(lastMovements(...gone, found('R-410A', 'clean', 'laboratory'))).toEqual([])
    expect(contentsAfter(...gone, found('R-410A', 'clean', 'laboratory'))).toMatchObject({ refrigerant: 'R-410A', inStock: false, netGrams: 8000 })
  })

  it('after it came back says what is in it, so that its tare alone does not empty it', () => {
    const back = [...gone, did('reclaimed', { shipmentId: SHIPMENT }), did('returned', { fromFirmId: SUPPLIER }, { placeId: SHOP })]
    expect(contentsAfter(...back, found('R-22', 'suspect'), weighed(12))).toMatchObject({ nothingInIt: false, refrigerant: 'R-22', netGrams: 0 })
  })
})

describe('who stands at a cylinder to check it', () => {
  it('has seen it', () => {
    const nowMs = VIEW_CONTEXT.nowMs + 31 * 24 * 3_600_000
    const day = { occurredAt: nowMs - 24 * 3_600_000, recordedAt: nowMs }
    expect(codes(viewAfter(full, { nowMs }))).toContain('not-seen')
    expect(codes(viewAfter([...full, did('checked', { method: 'pressure', pressureKPa: 1_000, temperatureC: 25 }, day)], { nowMs }))).not.toContain('not-seen')
  })
})
