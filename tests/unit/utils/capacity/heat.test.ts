import { describe, expect, it } from 'vitest'
import { heatCurve, temperaturesAboveTable } from '~~/utils/capacity/heat'
import type { MassReading } from '~~/utils/quantity/mass'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'

// 9.9904 kg of water at 60 F are 10 L.
const TEN_LITRES: MassReading = { unit: 'kg', value: 9.9904 }

function heated(designation: string, netGrams: number, ...temperaturesC: number[]) {
  const refrigerant = CATALOGUE.refrigerants.get(designation)!
  const supercritical = CATALOGUE.supercritical.get(designation) ?? null
  return heatCurve({ netGrams, waterCapacity: TEN_LITRES, refrigerant, supercritical }, temperaturesC)
}

describe('a filled cylinder that warms', () => {
  it('fills with liquid as it warms, at the bubble pressure, until it is full', () => {
    // R-410A, kg/m3 of liquid and vapour: 1058.6 and 65.97 at 25 C (1657.4 kPa), 865.5 and 167.0 at 55 C.
    const [mild, hot] = heated('R-410A', 9000, 25, 55)
    expect(mild).toMatchObject({ tC: 25, phase: 'two-phase', pressureKPa: expect.closeTo(1657.4, 6) })
    // (900 - 65.97) / (1058.6 - 65.97) = 0.84022.
    expect(mild?.liquidShare).toBeCloseTo(0.84022, 5)
    expect(hot).toEqual({ tC: 55, phase: 'liquid-full', liquidShare: 1, pressureKPa: null })
  })

  it('has no figure above its table where no other is held', () => {
    expect(heated('R-410A', 9000, 60)).toHaveLength(1)
    expect(() => heated('R-410A', 9000, 60.01)).toThrow(RangeError)
    expect(temperaturesAboveTable(CATALOGUE.refrigerants.get('R-410A')!, null)).toEqual([])
  })
})

describe('a cylinder of gas above its critical temperature', () => {
  it('has the pressure of its fill density, and no liquid to speak of', () => {
    // R-744 at 600 kg/m3: 13,569 kPa at 55 C, 12,256.2 at 50 C.
    expect(heated('R-744', 6000, 50, 55)).toEqual([
      { tC: 50, phase: 'supercritical', liquidShare: null, pressureKPa: expect.closeTo(12_256.2, 6) },
      { tC: 55, phase: 'supercritical', liquidShare: null, pressureKPa: expect.closeTo(13_569, 6) },
    ])
  })

  it('has no pressure thinner than 100 or denser than 1,000 kg/m3, where none is held', () => {
    expect(heated('R-744', 1001, 55)[0]?.pressureKPa).toBeGreaterThan(4946.4)
    expect(heated('R-744', 999, 55)[0]?.pressureKPa).toBeNull()
    expect(heated('R-744', 9999, 55)[0]?.pressureKPa).toBeLessThan(66_838.2)
    expect(heated('R-744', 10_001, 55)[0]?.pressureKPa).toBeNull()
  })

  it('is known at the temperatures of its pressures alone, not between them', () => {
    expect(() => heated('R-744', 6000, 54)).toThrow(RangeError)
    expect(temperaturesAboveTable(CATALOGUE.refrigerants.get('R-744')!, CATALOGUE.supercritical.get('R-744')!)).toEqual([50, 54.4, 55, 65])
  })

  it('stays with its saturation table as far as that goes', () => {
    // R-744 at 21.1 C: 761.3 and 203.2 kg/m3, 5878.5 kPa; (600 - 203.2) / (761.3 - 203.2) = 0.71098.
    const [mild] = heated('R-744', 6000, 21.1)
    expect(mild).toMatchObject({ phase: 'two-phase', pressureKPa: expect.closeTo(5878.5, 6) })
    expect(mild?.liquidShare).toBeCloseTo(0.71098, 5)
  })
})

describe('a cylinder of gas just below its critical temperature', () => {
  // R-23 is critical at 26.1 C; at 21.1 C it boils at 4274.1 kPa, from 300 to 750 kg/m3.
  it.each([
    [5000, 'two-phase', null, 4274.1], [3001, 'two-phase', null, 4274.1], [7499, 'two-phase', null, 4274.1],
    [5555, 'two-phase', null, 4274.1], [2500, 'vapour', 0, 4175.5], [8000, 'liquid-full', 1, 4301.7],
  ])('holds %d g of R-23 in 10 L as %s', (netGrams, phase, liquidShare, pressureKPa) => {
    expect(heated('R-23', netGrams, 21.1)).toEqual([{ tC: 21.1, phase, liquidShare, pressureKPa: expect.closeTo(pressureKPa, 6) }])
  })

  it('is vapour alone just thinner than that and liquid alone just denser', () => {
    expect(heated('R-23', 2999, 21.1)[0]?.phase).toBe('vapour')
    expect(heated('R-23', 7501, 21.1)[0]?.phase).toBe('liquid-full')
  })

  it('says on which side it is also where no pressure is held', () => {
    expect(heated('R-23', 500, 21.1)[0]).toEqual({ tC: 21.1, phase: 'vapour', liquidShare: 0, pressureKPa: null })
    expect(heated('R-23', 10_500, 21.1)[0]).toEqual({ tC: 21.1, phase: 'liquid-full', liquidShare: 1, pressureKPa: null })
  })
})
