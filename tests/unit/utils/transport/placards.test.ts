import { describe, expect, it } from 'vitest'
import type { MassReading } from '~~/utils/quantity/mass'
import { placardFromGrams, placards, type LoadedLine } from '~~/utils/transport/placards'

describe('placards', () => {
  // 49 CFR 172.504(c): less than 454 kg (1,001 pounds) aggregate gross of table 2 needs none. 1,000.9 lb = 454,000.6 g.
  it('are not needed at 1,000.9 lb gross and needed at 1,001 lb', () => {
    expect(placards([gas('2.2', 500), gas('2.2', 500.9)], 'lb')).toMatchObject({ state: 'not-needed', names: [] })
    expect(placards([gas('2.2', 500), gas('2.2', 501)], 'lb')).toMatchObject({ state: 'needed', names: ['NON-FLAMMABLE GAS'] })
    expect(placardFromGrams('lb')).toBeCloseTo(454_045.96, 2)
  })

  it('are judged by the kilograms of the regulation where it is weighed in kilograms: 453.99 and 454', () => {
    expect(placards([kilograms(453.99)], 'kg').state).toBe('not-needed')
    expect(placards([kilograms(454)], 'kg').state).toBe('needed')
  })

  it('are reached by ten readings of 100.1 lb, whatever each loses as whole grams', () => {
    expect(placards(Array.from({ length: 10 }, () => gas('2.2', 100.1)), 'lb').state).toBe('needed')
    expect(placards([...Array.from({ length: 9 }, () => gas('2.2', 100.1)), gas('2.2', 100)], 'lb').state).toBe('not-needed')
  })

  it('never say of a load below it that it weighs as much', () => {
    // 15.9 oz above 1,000 lb: to the nearest ounce it would read 1001 lb 0 oz.
    const { state, notes } = placards([line({ unit: 'lb-oz', lb: 1000, oz: 15.9 }, gas('2.2', 0).description)], 'lb-oz')
    expect(state).toBe('not-needed')
    expect(notes[0]).toMatch(/^1000.lb.15.oz gross/)
  })

  // 49 CFR 172.504(d).
  it('do not count residue, unless it poisons by inhalation', () => {
    const residue = { ...gas('2.2', 600), isResidue: true }
    expect(placards([gas('2.2', 1000.9), residue], 'lb')).toMatchObject({ state: 'not-needed', notes: expect.arrayContaining([expect.stringContaining('172.504(d)')]) })
    expect(placards([gas('2.2', 401), { ...ammonia(600), isResidue: true }], 'lb').state).toBe('needed')
  })

  // 49 CFR 172.504(e), table 1; (f)(3); (b).
  it('are shown for any quantity of division 2.3', () => {
    expect(placards([gas('2.3', 1)], 'lb')).toMatchObject({ state: 'needed', names: ['POISON GAS'] })
  })

  it('of both divisions may be one: FLAMMABLE GAS alone, or DANGEROUS below 2,205 lb of each', () => {
    const both = placards([gas('2.1', 300), gas('2.2', 701)], 'lb')
    expect(both.names).toEqual(['FLAMMABLE GAS', 'NON-FLAMMABLE GAS'])
    expect(both.notes.join('\n')).toContain('172.504(f)(3)')
    expect(both.notes.join('\n')).toContain('DANGEROUS may stand in place of both')
    expect(placards([gas('2.1', 300), gas('2.2', 2204.9)], 'lb').notes.join('\n')).toContain('DANGEROUS may stand in place of both')
    expect(placards([gas('2.1', 300), gas('2.2', 2205)], 'lb').notes.join('\n')).toContain('DANGEROUS may not stand')
  })

  it('are not known where a cylinder is not weighed and the rest stays below', () => {
    expect(placards([gas('2.2', 900), { ...gas('2.2', 0), gross: null }], 'lb')).toMatchObject({ state: 'not-known', notWeighed: 1 })
    expect(placards([gas('2.2', 1001), { ...gas('2.2', 0), gross: null }], 'lb').state).toBe('needed')
  })

  it('are not known where nobody has said how a cylinder travels', () => {
    const open = line({ unit: 'lb', value: 100 }, { identification: null, division: null, words: [], needsChoice: true })
    expect(placards([gas('2.2', 500), open], 'lb')).toMatchObject({ state: 'not-known', notes: expect.arrayContaining(['1 cylinder is not classified and not counted.']) })
  })

  it('are not asked for what is no hazardous material', () => {
    expect(placards([{ description: { identification: null, division: null, words: [], needsChoice: false }, isResidue: false, gross: { unit: 'lb', value: 5000 } }], 'lb')).toMatchObject({ state: 'not-needed', notes: [] })
  })
})

function gas(division: '2.1' | '2.2' | '2.3', pounds: number): LoadedLine {
  return line({ unit: 'lb', value: pounds }, { identification: 'UN0000', division, words: [], needsChoice: false })
}

function ammonia(pounds: number): LoadedLine {
  return line({ unit: 'lb', value: pounds }, { identification: 'UN1005', division: '2.2', words: ['Inhalation Hazard'], needsChoice: false })
}

function kilograms(value: number): LoadedLine {
  return line({ unit: 'kg', value }, { identification: 'UN1018', division: '2.2', words: [], needsChoice: false })
}

function line(gross: MassReading, description: LoadedLine['description']): LoadedLine {
  return { description, isResidue: false, gross }
}
