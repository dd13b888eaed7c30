import { describe, expect, it } from 'vitest'
import type { ShipmentLine } from '../../../../utils/contract/shipments'
import { dispatchSum, weighedLine } from '../../../../utils/shipment/dispatchSum'
import { cylinderRow } from '../../../helpers/cylinderRow'

function line(id: string, change = {}): ShipmentLine {
  return { cylinder: cylinderRow({ id, ...change }), version: 7, because: [], weighed: null, sent: null, received: null, returnedAt: null }
}

describe('a shipment being weighed', () => {
  it('takes the tare off what the scale shows, and adds up only what is weighed', () => {
    const lines = [weighedLine(line('a'), { unit: 'kg', value: 22.72 }), weighedLine(line('b'))]
    expect(lines[0]).toMatchObject({ grossGrams: 22_720, netGrams: 10_246 })
    expect(lines[1]).toMatchObject({ grossGrams: null, netGrams: null })
    expect(dispatchSum(lines)).toEqual({ weighed: 1, grossGrams: 22_720, netGrams: 10_246, nets: 1 })
  })

  it('has no net where the tare is not known', () => {
    const lines = [weighedLine(line('a', { tareWeightGrams: null }), { unit: 'kg', value: 22.72 })]
    expect(dispatchSum(lines)).toEqual({ weighed: 1, grossGrams: 22_720, netGrams: null, nets: 0 })
  })

  // Known: 12474 + 10251 = 22725 g, off by at most 114 g; a new gross of 22950 g by 115 g: together 229 g.
  it('tells a change beyond both weighings from one within them', () => {
    const changed = (kg: number) => weighedLine(line('a'), { unit: 'kg', value: kg }).changedGrams
    expect(changed(22.954)).toBeNull()
    expect(changed(22.955)).toBe(230)
  })

  it('sees the first gram above the fill limit', () => {
    const full = line('a', { exactStopWeightGrams: 12_474 + 17_272 })
    const over = (grams: number) => weighedLine(full, { unit: 'kg', value: grams / 1000 }).over
    expect(over(12_474 + 17_272)).toBe(false)
    expect(over(12_474 + 17_273)).toBe(true)
  })

  it('lets a cylinder leave that was filled to its very stop weight', () => {
    // WC 24.0 lb, TW 15.0 lb: 34.2 lb, in whole grams 6,804 + 8,708 = 15,512, though 34.2 lb are 15,513.
    const full = line('a', { tareWeightGrams: 6804, fillLimitGrams: 8708, exactStopWeightGrams: 34.2 * 453.59237 })
    const over = (value: number) => weighedLine(full, { unit: 'lb', value }).over
    expect(over(34.2)).toBe(false)
    expect(over(34.3)).toBe(true)
  })

  it('sees an excess where there is a limit but no stop weight', () => {
    const overdue = line('a', { exactStopWeightGrams: null })
    expect(weighedLine(overdue, { unit: 'kg', value: 29.747 }).over).toBe(true)
    expect(weighedLine(overdue, { unit: 'kg', value: 29.746 }).over).toBe(false)
  })
})
