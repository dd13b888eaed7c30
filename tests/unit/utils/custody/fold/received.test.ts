import { describe, expect, it } from 'vitest'
import {
  contentsAfter, did, filled, folded, kg, lastMovements, LOT, registered, RECLAIMER_PLACE, SHIPMENT, SHOP, SUPPLIER, TECHNICIAN, viewAfter, weighed,
} from '~~/tests/helpers/custody'

const received = (grossKg?: number, fromFirmId?: string) => did('received', {
  ...(grossKg === undefined ? {} : { gross: kg(grossKg) }), ...(fromFirmId === undefined ? {} : { fromFirmId }),
}, { placeId: SHOP })
const held = [registered(), filled('R-22', 20), did('handed-over', { toHolderId: TECHNICIAN })]
const gone = [...held, did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(20) }, { placeId: RECLAIMER_PLACE })]

describe('a received cylinder', () => {
  it('is at its place with nobody, and keeps its net where it was not weighed', () => {
    expect(folded(...held, received()).state).toMatchObject({ placeId: SHOP, holderId: null, contents: { netGrams: 8000 } })
    expect(lastMovements(...held, received())).toEqual([])
  })

  it('weighed, books the change as received with it from a firm, else as a weighing', () => {
    expect(lastMovements(...held, received(21, SUPPLIER))).toEqual(['received-with R-22 1000'])
    expect(lastMovements(...held, received(21))).toEqual(['weighing R-22 1000'])
  })

  it('ends a stay at the test station', () => {
    const story = [...held, did('sent-for-test', { lotId: LOT })]
    expect(viewAfter(story).lifecycle).toBe('at-test')
    expect(viewAfter([...story, received()])).toMatchObject({ lifecycle: 'in-service', contents: { netGrams: 8000 } })
  })

  it('from a reclaimer holds nobody knows what', () => {
    expect(contentsAfter(...gone, received())).toMatchObject({ inStock: true, refrigerant: null, condition: 'unknown', netGrams: null, nothingInIt: false })
  })
})

describe('a returned cylinder', () => {
  const returned = (grossKg?: number) => did('returned', { fromFirmId: SUPPLIER, ...(grossKg === undefined ? {} : { gross: kg(grossKg) }) }, { placeId: SHOP })

  it('from a reclaimer is unknown and not weighed, and asks for its weight', () => {
    const shown = viewAfter([...gone, returned()])
    expect(shown).toMatchObject({ lifecycle: 'in-service', contents: { refrigerant: null, condition: 'unknown', netGrams: null, nothingInIt: false } })
    expect(shown.capacity.missing).toEqual(['refrigerant', 'weight'])
    expect(lastMovements(...gone, returned())).toEqual([])
  })

  it('from a reclaimer has nothing in it once it weighs no more than its tare', () => {
    expect(contentsAfter(...gone, returned(12.05))).toMatchObject({ nothingInIt: true, evacuated: false, netGrams: 0 })
    expect(contentsAfter(...gone, returned(), weighed(12.05))).toMatchObject({ nothingInIt: true, evacuated: false, netGrams: 0 })
    expect(contentsAfter(...gone, returned(), weighed(12.1))).toMatchObject({ nothingInIt: false, refrigerant: null, netGrams: 100 })
  })

  it('from a reclaimer and filled before it was weighed is not empty for weighing no more than its tare later', () => {
    expect(contentsAfter(...gone, returned(), filled('R-22', 20), weighed(12))).toMatchObject({ nothingInIt: false, refrigerant: null, condition: 'unknown', netGrams: 0 })
  })

  it('from a reclaimer with a weight above its tare brings that in, by no name', () => {
    expect(lastMovements(...gone, returned(13))).toEqual(['returned-with ? 1000'])
  })

  it('from anywhere else keeps what is known of it', () => {
    expect(contentsAfter(...held, returned(20.5))).toMatchObject({ refrigerant: 'R-22', netGrams: 8500 })
    expect(lastMovements(...held, returned(20.5))).toEqual(['returned-with R-22 500'])
  })

  it('does not lift a rejection', () => {
    const story = [registered(), did('retested', { month: '2026-07', method: 'visual', result: 'rejected', requalifierId: SUPPLIER }), returned()]
    expect(viewAfter(story).lifecycle).toBe('rejected')
  })
})
