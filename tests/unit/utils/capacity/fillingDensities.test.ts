import { describe, expect, it } from 'vitest'
import { bestRow, fillingDensityRows, hydrocarbonPercent, markedPressurePsig, rowFit } from '~~/utils/capacity/fillingDensities'
import type { FillingDensityRow } from '~~/utils/capacity/types'

const ROW: FillingDensityRow = { designation: 'R-0', gas: 'a gas', percent: 90, specs: ['3A480', '4BA240', '39'] }

describe('a row of filling densities', () => {
  it('is met by the same type with its mark or a higher one', () => {
    expect(rowFit(ROW, { spec: 'DOT-4BA', servicePressurePsig: 240 })).toBe('met')
    expect(rowFit(ROW, { spec: 'DOT-4BA', servicePressurePsig: 400 })).toBe('met')
    expect(rowFit(ROW, { spec: 'DOT-4BA', servicePressurePsig: 239 })).toBe('mark-below')
    expect(rowFit(ROW, { spec: 'DOT-4BA', servicePressurePsig: null })).toBe('mark-below')
  })

  it('is not met by another type, however strong', () => {
    expect(rowFit(ROW, { spec: 'DOT-4BW', servicePressurePsig: 500 })).toBe('spec-not-listed')
    expect(rowFit(ROW, { spec: 'DOT-3AA', servicePressurePsig: 2400 })).toBe('spec-not-listed')
  })

  it('asks for no mark where it prints none', () => {
    expect(rowFit(ROW, { spec: 'DOT-39', servicePressurePsig: null })).toBe('met')
  })

  it('is the best one that a cylinder meets where a gas has several', () => {
    expect(bestRow('R-744', { spec: 'DOT-3AA', servicePressurePsig: 2300 })?.percent).toBe(73.2)
    expect(bestRow('R-744', { spec: 'DOT-3AL', servicePressurePsig: 2400 })?.percent).toBe(68)
    expect(bestRow('R-744', { spec: 'DOT-4BA', servicePressurePsig: 500 })).toBeNull()
  })

  it('is none for a gas that the table does not name', () => {
    expect(fillingDensityRows('R-410A')).toEqual([])
  })
})

describe('the filling density of a hydrocarbon', () => {
  it('changes at the edge of a band, taken to three decimals', () => {
    expect(hydrocarbonPercent(0.503)).toBe(41)
    expect(hydrocarbonPercent(0.5034)).toBe(41)
    expect(hydrocarbonPercent(0.5036)).toBe(42)
    expect(hydrocarbonPercent(0.504)).toBe(42)
  })

  it('is not known outside the table', () => {
    expect(hydrocarbonPercent(0.2704)).toBeNull()
    expect(hydrocarbonPercent(0.271)).toBe(26)
    expect(hydrocarbonPercent(0.634)).toBe(57)
    expect(hydrocarbonPercent(0.635)).toBeNull()
  })
})

describe('the service pressure of a cylinder', () => {
  it('is the mark, else what its specification stands for', () => {
    expect(markedPressurePsig({ spec: 'DOT-4BA', servicePressurePsig: 400 })).toBe(400)
    expect(markedPressurePsig({ spec: 'DOT-4BA', servicePressurePsig: null })).toBeNull()
    expect(markedPressurePsig({ spec: 'DOT-3E', servicePressurePsig: null })).toBe(1800)
    expect(markedPressurePsig({ spec: 'DOT-4B240ET', servicePressurePsig: null })).toBe(240)
  })
})
