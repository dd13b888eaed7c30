import { describe, expect, it } from 'vitest'
import { liquidFullTemperature } from '~~/utils/capacity/liquidFull'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'

// 10 L of volume hold 9,990.4 g of water at 60 F.
const WATER_GRAMS = 9990.4

function fullAt(designation: string, netGrams: number) {
  return liquidFullTemperature({
    netGrams, waterCapacityGrams: WATER_GRAMS, refrigerant: CATALOGUE.refrigerants.get(designation) ?? null,
  })
}

describe('the liquid-full temperature', () => {
  it('is the temperature of the row whose liquid fills the volume exactly', () => {
    // R-410A: 1058.6 kg/m3 at 25 C, 865.5 at 55 C.
    expect(fullAt('R-410A', 10_586)).toEqual({ c: expect.closeTo(25, 2) })
    expect(fullAt('R-410A', 8655)).toEqual({ c: expect.closeTo(55, 2) })
  })

  it('is never given too high', () => {
    const full = fullAt('R-410A', 8655)
    expect(full && 'c' in full ? full.c : Infinity).toBeLessThanOrEqual(55)
  })

  it('lies above the table where the last row still leaves vapour', () => {
    // R-410A: 815.5 kg/m3 at 60 C, its last row.
    expect(fullAt('R-410A', 8154)).toEqual({ aboveC: 60 })
    expect(fullAt('R-410A', 8156)).toEqual({ c: expect.closeTo(60, 1) })
  })

  it('is never where all of it is vapour at the last row', () => {
    // R-410A: 200.8 kg/m3 of vapour at 60 C.
    expect(fullAt('R-410A', 2007)).toEqual({ never: true })
    expect(fullAt('R-410A', 2009)).toEqual({ aboveC: 60 })
    expect(fullAt('R-410A', 0)).toEqual({ never: true })
  })

  it('is the coldest row for a cylinder that is full everywhere', () => {
    expect(fullAt('R-410A', 20_000)).toEqual({ c: -40 })
  })

  it('lies between the rows elsewhere, where the liquid weighs what is in it', () => {
    // R-410A: 865.5 kg/m3 at 55 C, 815.5 at 60 C, on a curve that bends down: half way down lies past half way along.
    const full = fullAt('R-410A', 8405)
    expect(full).toEqual({ c: expect.closeTo(57.6, 1) })
  })

  it('of a gas when hot is never for a thin fill, and beyond its table for a dense one', () => {
    // R-23 at 15 C, its last row: 890.4 and 207.6 kg/m3. R-744 at 21.1 C: 761.3 and 203.2.
    expect(fullAt('R-23', 2075)).toEqual({ never: true })
    expect(fullAt('R-23', 2077)).toEqual({ aboveC: 15 })
    expect(fullAt('R-744', 6800)).toEqual({ aboveC: 21.1 })
    expect(fullAt('R-744', 7613)).toEqual({ c: expect.closeTo(21.1, 2) })
  })

  it('is not known without a refrigerant or a water capacity', () => {
    expect(fullAt('R-13B1', 8000)).toBeNull()
    const refrigerant = CATALOGUE.refrigerants.get('R-22') ?? null
    expect(liquidFullTemperature({ netGrams: 1, waterCapacityGrams: null, refrigerant })).toBeNull()
  })
})
