import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readRetestMark, readRin } from '~~/utils/requalification/retestMark'
import { suffixMeaning, tidySuffix } from '~~/utils/requalification/retestSuffix'
import { retestMarkParts, retestMarkText } from '~~/utils/requalification/struckMark'
import { methodDoubt, suffixDoubt } from '~~/utils/requalification/suffixDoubt'

const NOW = '2026-12'

describe('a retest mark that was typed', () => {
  it.each<[string, string, string | null, string | null]>([
    ['9 A123 06', '2006-09', 'A123', null],
    ['09-A123-06', '2006-09', 'A123', null],
    ['9-A123-06 S', '2006-09', 'A123', 'S'],
    ['9 a123 06s', '2006-09', 'A123', 'S'],
    ['09/06 A123 E', '2006-09', 'A123', 'E'],
    ['9/2006 A123', '2006-09', 'A123', null],
    ['2006-09 A123 *', '2006-09', 'A123', '*'],
    ['9 A123 06★', '2006-09', 'A123', '*'],
    ['9 A123 06 +', '2006-09', 'A123', '+'],
    ['9 A123 06 *+', '2006-09', 'A123', '+*'],
    ['9A12306', '2006-09', 'A123', null],
    ['9A12306S', '2006-09', 'A123', 'S'],
    ['9 1234 06', '2006-09', '1234', null],
    ['12 B7K9 25 UE', '2025-12', 'B7K9', 'UE'],
  ])('%j', (text, month, rin, suffix) => {
    expect(readRetestMark(text, NOW)).toEqual({ month, rin, suffix })
  })

  it.each(['9 A1/32 06', '9 A1 32 06', '9 A1|32 06', '09/06 A1/32', '9\nA1\n32\n06'])('%j has the two rows of its square, read clockwise', (text) => {
    expect(readRetestMark(text, NOW)).toMatchObject({ month: '2006-09', rin: 'A123' })
  })

  it.each<[string, string, string | null]>([
    ['9/06', '2006-09', null], ['03-21', '2021-03', null], ['2021-03', '2021-03', null], ['9.06', '2006-09', null], ['9 06 S', '2006-09', 'S'], ['9 06AE', '2006-09', 'AE'],
  ])('%j has no RIN', (text, month, suffix) => {
    expect(readRetestMark(text, NOW)).toEqual({ month, rin: null, suffix })
  })

  it('keeps a suffix that is none, to be looked at', () => {
    expect(readRetestMark('9 A123 06 V', NOW)?.suffix).toBe('V')
    expect(readRetestMark('9 A123 06 DT', NOW)?.suffix).toBe('DT')
  })

  it.each(['', 'hello', '13 A123 06', '0 A123 06', '9 A12 06', '9 A1234 06', '9 2006 12', 'A123', '9', '9 A123 06 ABCD', '9 A123'])('%j cannot be read', (text) => {
    expect(readRetestMark(text, NOW)).toBeNull()
  })

  it('takes a year of two digits as the latest that lies at most five years ahead', () => {
    expect(readRetestMark('9 A123 98', NOW)?.month).toBe('1998-09')
    expect(readRetestMark('9 A123 31', NOW)?.month).toBe('2031-09')
    expect(readRetestMark('9 A123 32', NOW)?.month).toBe('1932-09')
  })

  it('reads back every mark as it is drawn, whatever month, RIN and suffix', () => {
    const rin = fc.tuple(fc.constantFrom(...'ABKZ'), fc.stringMatching(/^[A-Z0-9]{3}$/)).map(([first, rest]) => first + rest)
    fc.assert(fc.property(fc.integer({ min: 1932, max: 2031 }), fc.integer({ min: 1, max: 12 }), rin, fc.constantFrom('', '*', '+', 'S', 'E', 'UE'), (year, month, rin, suffix) => {
      const kept = { month: `${year}-${String(month).padStart(2, '0')}`, rin, suffix: suffix || null }
      const { square, ...drawn } = retestMarkParts(kept)
      expect(readRetestMark(`${drawn.month} ${square!.upper}/${square!.lower} ${drawn.year} ${drawn.suffix}`, NOW)).toEqual(kept)
    }))
  })
})

describe('a retest mark as it is struck', () => {
  it('has month, RIN in its square, two-digit year and suffix', () => {
    expect(retestMarkParts({ month: '2006-09', rin: 'A123' })).toEqual({ month: '9', square: { upper: 'A1', lower: '32' }, year: '06', suffix: '' })
    expect(retestMarkParts({ month: '2025-12', rin: 'b7k9', suffix: '★' })).toEqual({ month: '12', square: { upper: 'B7', lower: '9K' }, year: '25', suffix: '*' })
  })

  it('has an empty square where the RIN is not known', () => {
    expect(retestMarkParts({ month: '2006-09' }).square).toBeNull()
    expect(retestMarkParts({ month: '2006-09', rin: 'A12' }).square).toBeNull()
  })

  it('reads as a sentence', () => {
    expect(retestMarkText({ month: '2006-09', rin: 'A123' })).toBe('Tested September 2006 by RIN A123, no suffix: volumetric expansion test')
    expect(retestMarkText({ month: '2006-09', suffix: 'S' })).toBe('Tested September 2006, RIN not noted, suffix S: proof pressure test')
    expect(retestMarkText({ month: '2026-07', rin: 'A123', method: 'proof' })).toBe('Tested July 2026 by RIN A123, no suffix: proof pressure test')
    expect(retestMarkText({ month: '2006-09', rin: 'A123', suffix: '+*' })).toMatch(/^Tested September 2006 by RIN A123, suffix plus star: volumetric expansion test/)
    expect(retestMarkText({ month: '2006-09', rin: 'A123', suffix: 'V' })).toBe('Tested September 2006 by RIN A123, suffix V: no suffix of a retest mark')
  })
})

describe('a RIN', () => {
  it('has four letters or figures', () => {
    expect(['A123', 'b7k9', ' Z000 ', '1234'].map(readRin)).toEqual(['A123', 'B7K9', 'Z000', '1234'])
    expect(['', 'A12', 'A1234', 'A-12', 'Ä123'].map(readRin)).toEqual([null, null, null, null, null])
  })

  it('may be typed as the rows of its square', () => {
    expect(['A1/32', 'a1 32', 'A1\n32'].map(readRin)).toEqual(['A123', 'A123', 'A123'])
  })
})

describe('a suffix', () => {
  it('is read in whatever way it is typed', () => {
    expect(['s', ' S ', 'fs', '★', '☆', '*+', '+ *'].map(tidySuffix)).toEqual(['S', 'S', 'FS', '*', '*', '+*', '+*'])
  })

  it('is doubted where no mark has it', () => {
    expect(suffixDoubt('')).toBeNull()
    expect(suffixDoubt('s')).toBeNull()
    expect(suffixDoubt('V')).toContain('No retest mark ends in V')
    expect(suffixDoubt('DT')).toContain('dip tube')
    expect(suffixMeaning('V')).toBeNull()
    expect(suffixMeaning('constructor')).toBeNull()
  })

  it('is doubted where it does not fit the method', () => {
    expect(['', '+', '*', 'UE'].map(suffix => methodDoubt(suffix, 'volumetric'))).toEqual([null, null, null, null])
    expect(methodDoubt('S', 'proof')).toBeNull()
    expect(methodDoubt('E', 'visual')).toBeNull()
    expect(methodDoubt('S', 'volumetric')).toContain('A volumetric test has no suffix')
    expect(methodDoubt('', 'proof')).toContain('is marked S')
    expect(methodDoubt('S', 'visual')).toContain('is marked E')
  })
})
