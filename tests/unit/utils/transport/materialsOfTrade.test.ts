import { describe, expect, it } from 'vitest'
import type { Division } from '~~/utils/refrigerant/data/unEntries'
import { tradeException } from '~~/utils/transport/materialsOfTrade'
import type { LoadedLine } from '~~/utils/transport/placards'
import { MATERIALS_OF_TRADE } from '~~/utils/transport/vanLoad'

const OWN = { carriedBy: 'own-vehicle', unit: 'lb' } as const

// 49 CFR 173.6(a)(2): 220 lb gross each; (d): 440 lb gross together.
describe('materials of trade', () => {
  it('are limited to 99,790 g each and 199,580 g together: 220 and 440 lb', () => {
    expect(Math.floor(MATERIALS_OF_TRADE.eachGrams)).toBe(99_790)
    expect(Math.floor(MATERIALS_OF_TRADE.togetherGrams)).toBe(199_580)
  })

  it('may be a cylinder of 220 lb, not one of 220.1 lb', () => {
    expect(tradeException([gas(220)], OWN).state).toBe('may')
    expect(tradeException([gas(220.1)], OWN)).toMatchObject({ state: 'may-not', because: [expect.stringContaining('173.6(a)(2)')] })
  })

  it('may be 440 lb together, not 440.1 lb', () => {
    expect(tradeException([gas(220), gas(220)], OWN).state).toBe('may')
    expect(tradeException([gas(220), gas(219.9), gas(0.2)], OWN)).toMatchObject({ state: 'may-not', because: [expect.stringContaining('173.6(d)')] })
    // To the nearest tenth it would read as the limit itself.
    expect(tradeException([gas(220), gas(220.04)], OWN).because.at(-1)).toMatch(/^440\.1.lb gross together/)
  })

  it('never are what poisons by inhalation, nor what a carrier takes', () => {
    expect(tradeException([gas(50, '2.3')], OWN)).toMatchObject({ state: 'may-not', because: [expect.stringContaining('173.6(a)(5)')] })
    expect(tradeException([gas(50)], { ...OWN, carriedBy: 'carrier' })).toMatchObject({ state: 'may-not', because: [expect.stringContaining('carrier')] })
  })

  it('are not known while a cylinder is not weighed or not classified, or nobody has said who carries it', () => {
    expect(tradeException([{ ...gas(50), description: { identification: null, division: null, words: [], needsChoice: true } }], OWN).state).toBe('not-known')
    expect(tradeException([{ ...gas(0), gross: null }], OWN).state).toBe('not-known')
    expect(tradeException([gas(50)], { ...OWN, carriedBy: 'not-said' }).state).toBe('not-known')
  })

  it('leave to the firm whether a load to a reclaimer is one, and tell the driver without a form', () => {
    const told = tradeException([gas(50)], OWN).because.join(' ')
    expect(told).toContain('171.8')
    expect(told).toContain('firm’s judgement')
    expect(told).toContain('driver is told')
  })
})

function gas(pounds: number, division: Division = '2.2'): LoadedLine {
  return { description: { identification: 'UN1018', division, words: [], needsChoice: false }, isResidue: false, gross: { unit: 'lb', value: pounds } }
}
