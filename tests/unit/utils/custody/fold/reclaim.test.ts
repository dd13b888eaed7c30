import { describe, expect, it } from 'vitest'
import {
  contentsAfter, did, filled, folded, HOUR, kg, lastFindings, lastMovements, registered, RECLAIMER_PLACE, SHIPMENT, SHOP, START, SUPPLIER, TECHNICIAN, viewAfter, weighed,
} from '~~/tests/helpers/custody'

const sent = (grossKg: number, shipmentId: string = SHIPMENT) => did('sent-for-reclaim', { shipmentId, gross: kg(grossKg) }, { placeId: RECLAIMER_PLACE })
const full = [registered(), filled('R-22', 20), did('handed-over', { toHolderId: TECHNICIAN })]
const OTHER_SHIPMENT = '0198f000-0000-7000-8000-0000000000e9'

describe('a cylinder sent for reclaim', () => {
  it('is at the reclaimer, held by nobody, with its contents out of stock', () => {
    const story = [...full, sent(20)]
    expect(folded(...story).state).toMatchObject({ placeId: RECLAIMER_PLACE, holderId: null })
    expect(viewAfter(story)).toMatchObject({
      lifecycle: 'at-reclaim', contents: { inStock: false, refrigerant: 'R-22', condition: 'clean', netGrams: 8000 },
      capacity: { stopWeightGrams: null, roomGrams: null },
    })
    expect(viewAfter(story).capacity.refusals.map(({ code }) => code)).toEqual(['away'])
  })

  it('is weighed as it goes, and leaves with that weight', () => {
    expect(lastMovements(...full, sent(19.8))).toEqual(['weighing R-22 -200', 'shipped R-22 -7800'])
  })

  it('weighed below its tare leaves with what the log knew, and a net that nobody knows', () => {
    expect(lastMovements(...full, sent(11))).toEqual(['shipped R-22 -8000'])
    expect(contentsAfter(...full, sent(11))).toMatchObject({ netGrams: null, inStock: false })
  })

  it('sent a second time without having come back came back with what it left with', () => {
    expect(lastMovements(...full, sent(20), sent(20, OTHER_SHIPMENT))).toEqual(['opening R-22 8000', 'shipped R-22 -8000'])
    expect(lastFindings(...full, sent(20), sent(20, OTHER_SHIPMENT))).toEqual(['away'])
  })
})

describe('a reclaimed cylinder', () => {
  const reclaimed = did('reclaimed', { shipmentId: SHIPMENT, acceptedNet: kg(7.9) })

  it('has nothing in it, not evacuated, and moves nothing a second time', () => {
    const story = [...full, sent(20), reclaimed]
    expect(contentsAfter(...story)).toMatchObject({ nothingInIt: true, evacuated: false, netGrams: 0, basis: 'reckoned', refrigerant: null, inStock: false })
    expect(lastMovements(...story)).toEqual([])
  })

  it('keeps what it came back with before the reclaimer\'s word was recorded', () => {
    const story = [...full, sent(20), did('returned', { fromFirmId: SUPPLIER, gross: kg(13) }, { placeId: SHOP }), reclaimed]
    expect(contentsAfter(...story)).toMatchObject({ nothingInIt: false, netGrams: 1000 })
  })

  it('is not emptied by the word on an earlier shipment', () => {
    const story = [...full, sent(20), weighed(20), sent(20, OTHER_SHIPMENT), reclaimed]
    expect(contentsAfter(...story)).toMatchObject({ nothingInIt: false, netGrams: 8000, inStock: false })
  })

  it('is emptied in its place in time when the word arrives late', () => {
    const late = did('reclaimed', { shipmentId: SHIPMENT }, { occurredAt: START + 3.5 * HOUR })
    const story = [...full, sent(20), did('returned', { fromFirmId: SUPPLIER }, { placeId: SHOP }), late]
    expect(contentsAfter(...story)).toMatchObject({ nothingInIt: false, netGrams: null, refrigerant: null })
  })

  it('weighed while it should be away is back, with a stop', () => {
    expect(lastFindings(...full, sent(20), weighed(19))).toEqual(['away'])
    expect(lastMovements(...full, sent(20), weighed(19))).toEqual(['opening R-22 8000', 'weighing R-22 -1000'])
  })
})
