import { describe, expect, it } from 'vitest'
import { damageSubject } from '../../../../utils/proof/damageWords'
import { jsonLines } from '../../../../utils/proof/jsonLines'

const NOWHERE = { kind: 'changed', cylinderId: null, version: null, seq: null, checkpoint: null }

describe('what a finding of verifying is about', () => {
  it.each([
    ['Checkpoint 2', { kind: 'checkpoint-forged', checkpoint: 2 }],
    ['From number 31 on', { kind: 'missing-number', seq: 31 }],
    ['Version 4, number 812', { cylinderId: 'c1', version: 4, seq: 812 }],
    ['The cylinder', { kind: 'row-differs', cylinderId: 'c1' }],
    ['The log', { kind: 'unreadable' }],
  ])('is %s', (words, where) => {
    expect(damageSubject({ ...NOWHERE, ...where })).toBe(words)
  })
})

describe('lines of JSON', () => {
  it('are handed over when they are whole, however they were cut', () => {
    const take = jsonLines()
    expect(take('{"done":1}\n{"do')).toEqual([{ done: 1 }])
    expect(take('ne":2')).toEqual([])
    expect(take('}\n\n{"done":3}\n')).toEqual([{ done: 2 }, { done: 3 }])
  })

  it('are refused where one is none', () => {
    expect(() => jsonLines()('half\n')).toThrow(SyntaxError)
  })
})
