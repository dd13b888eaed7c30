import { describe, expect, it } from 'vitest'
import { SPECS, splitSpec } from '~~/utils/requalification/specs'

describe('a specification mark', () => {
  it.each<[string, string, number | null]>([
    ['DOT-4BA400', 'DOT-4BA', 400],
    ['dot 4bw 260', 'DOT-4BW', 260],
    ['4BA-400', 'DOT-4BA', 400],
    ['DOT-4BA', 'DOT-4BA', null],
    ['DOT-3AA1800', 'DOT-3AA', 1800],
    ['3AL1800', 'DOT-3AL', 1800],
    ['DOT-3E1800', 'DOT-3E', 1800],
    ['DOT-3E', 'DOT-3E', 1800],
    ['DOT-4B240ET', 'DOT-4B240ET', 240],
    ['4AA480', 'DOT-4AA480', 480],
    ['3A480X', 'DOT-3A480X', 480],
    ['3A480', 'DOT-3A', 480],
    ['DOT-8', 'DOT-8', 250],
    ['DOT-8AL', 'DOT-8AL', null],
    ['DOT-39 NRC 260/325 M1004', 'DOT-39', 260],
    ['39', 'DOT-39', null],
    ['DOT-SP 12345', 'DOT-SP', null],
    ['DOT-E 1234', 'DOT-SP', null],
  ])('%j is %s with %s psig', (text, spec, servicePressurePsig) => {
    expect(splitSpec(text)).toEqual({ spec, servicePressurePsig })
  })

  it.each(['', 'DOT-', 'TC-4BAM28', 'DOT-5A400', '4BA4', 'DOT-4BA40000', 'hello'])('%j names none', (text) => {
    expect(splitSpec(text)).toBeNull()
  })
})

describe('the list of specifications', () => {
  it('names each as a stamp is kept', () => {
    for (const spec of Object.keys(SPECS)) expect(spec).toMatch(/^DOT-[0-9A-Z]+$/)
  })
})
