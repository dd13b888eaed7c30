import { describe, expect, it } from 'vitest'
import { did, folded, lastFindings, LOT, registered, SHOP, SUPERVISOR, TECHNICIAN, TEST_PLACE, VAN } from '~~/tests/helpers/custody'

describe('a cylinder handed over', () => {
  it('has another holder and stays where it is', () => {
    const story = [registered(), did('moved', { toPlaceId: VAN, toHolderId: TECHNICIAN }), did('handed-over', { toHolderId: SUPERVISOR })]
    expect(folded(...story).state).toMatchObject({ placeId: VAN, holderId: SUPERVISOR })
  })

  it('loses its holder when it comes back to a shop or leaves for a test', () => {
    const held = [registered(), did('handed-over', { toHolderId: TECHNICIAN })]
    expect(folded(...held, did('received', {}, { placeId: SHOP })).state.holderId).toBeNull()
    expect(folded(...held, did('sent-for-test', { lotId: LOT }, { placeId: TEST_PLACE })).state.holderId).toBeNull()
  })

  it('while it should be at its test is back, with a stop', () => {
    const story = [registered(), did('sent-for-test', { lotId: LOT }), did('handed-over', { toHolderId: TECHNICIAN })]
    expect(lastFindings(...story)).toEqual(['away'])
    expect(folded(...story).state.away).toBeNull()
  })
})
