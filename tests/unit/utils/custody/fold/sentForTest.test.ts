import { describe, expect, it } from 'vitest'
import { did, filled, folded, kg, lastFindings, lastMovements, LOT, registered, SHIPMENT, TECHNICIAN, TEST_PLACE, viewAfter, weighed } from '~~/tests/helpers/custody'

const sent = did('sent-for-test', { lotId: LOT }, { placeId: TEST_PLACE })
const full = [registered(), filled('R-22', 20), did('handed-over', { toHolderId: TECHNICIAN })]

describe('a cylinder sent for its test', () => {
  it('is at the test station, held by nobody, with what is in it still in stock', () => {
    expect(folded(...full, sent).state).toMatchObject({ placeId: TEST_PLACE, holderId: null, contents: { inStock: true, refrigerant: 'R-22', netGrams: 8000 } })
    expect(viewAfter([...full, sent]).lifecycle).toBe('at-test')
    expect(lastMovements(...full, sent)).toEqual([])
  })

  it('has no stop weight while it is away', () => {
    const { capacity } = viewAfter([...full, sent])
    expect(capacity).toMatchObject({ fillLimitGrams: 16_000, stopWeightGrams: null, roomGrams: null })
    expect(capacity.refusals.map(({ code }) => code)).toEqual(['away'])
  })

  it('filled or weighed meanwhile is back, with a stop', () => {
    expect(lastFindings(...full, sent, weighed(20))).toEqual(['away'])
    expect(lastFindings(...full, sent, filled('R-22', 21))).toEqual(['away'])
    expect(viewAfter([...full, sent, weighed(20)]).lifecycle).toBe('in-service')
  })

  it('straight from a reclaimer came back from there first', () => {
    const story = [...full, did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(20) }), sent]
    expect(lastFindings(...story)).toEqual(['away'])
    expect(lastMovements(...story)).toEqual(['opening R-22 8000'])
  })
})
