import { describe, expect, it } from 'vitest'
import { layOutFillBar } from '../../../../utils/picture/fillBar'

describe('the bar of a table row', () => {
  it('sets what is in it and the limit against the water-full cylinder', () => {
    expect(layOutFillBar(4_000, 8_000, 10_000)).toEqual({ limit: 80, filled: 40, over: 0 })
  })

  it('draws an excess past the limit', () => {
    expect(layOutFillBar(9_000, 8_000, 10_000)).toEqual({ limit: 80, filled: 80, over: 10 })
  })

  it('treats nothing in it as a mass', () => {
    expect(layOutFillBar(0, 8_000, 10_000)).toEqual({ limit: 80, filled: 0, over: 0 })
  })

  it.each([[null, 8_000, 10_000], [4_000, null, 10_000], [4_000, 8_000, null]])('is not drawn from %s, %s and %s', (net, limit, water) => {
    expect(layOutFillBar(net, limit, water)).toBeNull()
  })
})
