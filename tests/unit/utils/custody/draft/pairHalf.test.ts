import { describe, expect, it } from 'vitest'
import { kg, OTHER_CYLINDER } from '~~/tests/helpers/custody'
import { areHalvesOfOne, EXCHANGE_HALF, otherHalfMended, sayTheSame, TRANSFER_HALF } from '~~/utils/custody/draft/pairHalf'
import type { DetailsOf } from '~~/utils/custody/schema'

const out: DetailsOf<'transferred'> = {
  direction: 'out', counterpartId: OTHER_CYLINDER, transferId: 'pair', refrigerant: 'R-22', condition: 'clean', ownerOfRefrigerantId: 'owner', grossBefore: kg(20), grossAfter: kg(15),
}
const into: DetailsOf<'transferred'> = { direction: 'in', counterpartId: 'this', transferId: 'pair', refrigerant: 'R-22', condition: 'clean', grossAfter: kg(17) }

describe('the correction of one half of a transfer', () => {
  it('begins with all that the half says, and loses nothing of it', () => {
    const context = {} as never
    for (const details of [out, into, { ...into, refrigerant: null }]) {
      expect(TRANSFER_HALF.read(TRANSFER_HALF.of(details, null, 'kg'), context)).toEqual({ details })
    }
    expect(TRANSFER_HALF.read({ ...TRANSFER_HALF.of(out, null, 'kg'), grossAfter: null }, context)).toHaveProperty('reason')
  })

  it('gives the other half the same refrigerant, and leaves it its own weights', () => {
    const mended = { ...out, refrigerant: 'R-410A', condition: 'burnt', grossAfter: kg(14) }
    expect(otherHalfMended('transferred', mended, into)).toEqual({ ...into, refrigerant: 'R-410A', condition: 'burnt' })
    expect(sayTheSame('transferred', mended, into)).toBe(false)
    expect(sayTheSame('transferred', { ...out, grossAfter: kg(14) }, into)).toBe(true)
  })

  it('knows the other half by the pair and by its direction', () => {
    const line = (details: object, kind = 'transferred') => ({ kind, details })
    expect(areHalvesOfOne(line(out), line(into))).toBe(true)
    expect(areHalvesOfOne(line(out), line({ ...into, direction: 'out' }))).toBe(false)
    expect(areHalvesOfOne(line(out), line({ ...into, transferId: 'another' }))).toBe(false)
    expect(areHalvesOfOne(line({ direction: 'out', exchangeId: 'x' }, 'exchanged'), line({ direction: 'in', exchangeId: 'x' }, 'exchanged'))).toBe(true)
    expect(areHalvesOfOne(line({ direction: 'out' }, 'weighed'), line({ direction: 'in' }, 'weighed'))).toBe(false)
  })
})

it('the correction of an exchange says with which firm it was, and keeps the rest', () => {
  const half: DetailsOf<'exchanged'> = { direction: 'out', otherCylinderId: OTHER_CYLINDER, exchangeId: 'x', firmId: 'supplier' }
  expect(EXCHANGE_HALF.read({ ...EXCHANGE_HALF.of(half, null, 'kg'), firmId: 'reclaimer' }, {} as never)).toEqual({ details: { ...half, firmId: 'reclaimer' } })
  expect(EXCHANGE_HALF.read(EXCHANGE_HALF.empty({} as never), {} as never)).toHaveProperty('reason')
})
