import { describe, expect, it } from 'vitest'
import { ruleBody } from '~~/utils/contract/policy'

const rule = { kind: 'fill-policy', value: { share: 0.7, ceiling: 0.95, options: { liquid130F: true, unRatio: false } } }

function faults(reason: string): string[] {
  return ruleBody.safeParse({ ...rule, reason }).error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`) ?? []
}

describe('the reason of a rule', () => {
  it('is what can be read, in any script', () => {
    expect(['Insurer, 2026', '夏', '!', 'a\u200Bb'].flatMap(faults)).toEqual([])
  })

  it.each([
    ['a space of no width', '\u200B'], ['a word joiner and a soft hyphen', '\u2060 \u00AD'], ['the empty letter of Hangul', '\u3164'], ['blank braille', '\u2800'],
  ])('is not %s alone', (_, reason) => {
    expect(faults(reason)).toEqual(['reason: must hold a character that can be seen'])
  })

  it('is not nothing', () => {
    expect(faults('  ')).toEqual(['reason: must not be empty'])
  })
})
