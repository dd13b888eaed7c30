import { describe, expect, it } from 'vitest'
import { isFlammable, isToxic } from '~~/utils/refrigerant/safety'

describe('a safety class', () => {
  it.each<[string | null, boolean, boolean]>([
    ['A1', false, false], ['A2L', true, false], ['A2', true, false], ['A3', true, false],
    ['B1', false, true], ['B2L', true, true], ['B2', true, true], ['B3', true, true],
    [null, true, true],
  ])('%s: flammable %s, toxic %s', (safetyClass, flammable, toxic) => {
    expect(isFlammable(safetyClass)).toBe(flammable)
    expect(isToxic(safetyClass)).toBe(toxic)
  })
})
