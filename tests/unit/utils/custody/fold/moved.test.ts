import { describe, expect, it } from 'vitest'
import { did, filled, folded, kg, lastFindings, lastMovements, registered, RECLAIMER_PLACE, SHIPMENT, SHOP, TECHNICIAN, VAN } from '~~/tests/helpers/custody'

const taken = did('moved', { toPlaceId: VAN, toHolderId: TECHNICIAN })

describe('a moved cylinder', () => {
  it('is at the other place, with the holder that was named', () => {
    expect(folded(registered(), taken).state).toMatchObject({ placeId: VAN, holderId: TECHNICIAN })
  })

  it('has no holder where none was named', () => {
    expect(folded(registered(), taken, did('moved', { toPlaceId: SHOP })).state).toMatchObject({ placeId: SHOP, holderId: null })
  })

  it('keeps what is in it, without a movement of refrigerant', () => {
    const story = [registered(), filled('R-22', 20), taken]
    expect(folded(...story).state.contents.netGrams).toBe(8000)
    expect(lastMovements(...story)).toEqual([])
  })

  it('while it should be at the reclaimer is back with what it left with, and a stop', () => {
    const gone = [registered(), filled('R-22', 20), did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(20) }, { placeId: RECLAIMER_PLACE })]
    expect(lastFindings(...gone, taken)).toEqual(['away'])
    expect(lastMovements(...gone, taken)).toEqual(['opening R-22 8000'])
    expect(folded(...gone, taken).state).toMatchObject({ away: null, placeId: VAN, contents: { inStock: true, refrigerant: 'R-22', netGrams: 8000 } })
  })
})
