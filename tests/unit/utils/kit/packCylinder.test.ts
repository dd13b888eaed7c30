import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { initialState, type CylinderState } from '~~/utils/custody/state'
import { packCylinder, unpackCylinder } from '~~/utils/kit/packCylinder'
import { did, filled, folded, kg, registered, TECHNICIAN, VAN } from '../../../helpers/custody'
import { anyStory } from '../../../helpers/custodyArbitraries'

/** As it arrives at a phone: by way of a text. */
function arrived(state: CylinderState): string {
  return JSON.stringify(unpackCylinder(JSON.parse(JSON.stringify(packCylinder(state)))))
}

describe('a cylinder packed for a phone', () => {
  it('is there again exactly, to the order of its keys, whatever happened to it', () => {
    fc.assert(fc.property(anyStory, (story) => {
      const { state } = folded(...story)
      expect(arrived(state)).toBe(JSON.stringify(state))
    }), { numRuns: 500 })
  })

  it('is there again where nothing is known of it', () => {
    const state = initialState('0198f000-0000-7000-8000-0000000000c1')
    expect(arrived(state)).toBe(JSON.stringify(state))
  })

  it('keeps a net of 0 apart from a net that is not known', () => {
    const empty = folded(registered({ contents: 'evacuated', gross: kg(12) })).state
    const unknown = folded(registered({ contents: 'unknown' })).state
    expect(JSON.parse(arrived(empty)).contents.netGrams).toBe(0)
    expect(JSON.parse(arrived(unknown)).contents.netGrams).toBeNull()
  })

  it('keeps what a usual cylinder does not have: a hold, a second label, another\'s refrigerant', () => {
    const { state } = folded(
      registered(), did('labelled', { code: '7K3M9Q2TX' }), did('labelled', { code: '000000000', replaces: '7K3M9Q2TX' }),
      filled('R-22', 20, { ownerOfRefrigerantId: '0198f000-0000-7000-8000-0000000000f1' }), did('quarantined', { reason: 'an oily valve' }),
    )
    expect(arrived(state)).toBe(JSON.stringify(state))
    expect(unpackCylinder(packCylinder(state)).holds.map(({ hold }) => hold)).toEqual(['quarantined'])
  })

  it('says nothing twice: what follows from the rest is left out', () => {
    const { state } = folded(registered(), filled('R-22', 20), did('moved', { toPlaceId: VAN, toHolderId: TECHNICIAN }))
    // Its tare is that of the stamp, it was registered by its first event, and its last one saw it.
    for (const short of ['t', 'r', 's', 'k', 'S', 'H', 'u']) expect(packCylinder(state)).not.toHaveProperty(short)
  })
})
