import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { GWP_BASES, gwpOf } from '~~/utils/refrigerant/gwp'

const R32_WITH_R125 = { composition: [{ component: 'R-32', massPercent: 50 }, { component: 'R-125', massPercent: 50 }] }
const WITH_PENTANE = { composition: [{ component: 'R-134a', massPercent: 99.4 }, { component: 'R-601a', massPercent: 0.6 }] }

describe('the GWP of a refrigerant on a basis', () => {
  it('is the sum of mass fraction times the component value, with the parts beside it', () => {
    // 0.5 x 675 + 0.5 x 3500.
    const { value, parts, because } = gwpOf(R32_WITH_R125, 'AR4')
    expect(value).toBe(2087.5)
    expect(because).toBeUndefined()
    expect(parts.map(part => [part.component, part.massPercent, part.gwp])).toEqual([['R-32', 50, 675], ['R-125', 50, 3500]])
    expect(parts.every(part => part.source?.includes('Table 2.14'))).toBe(true)
  })

  it('differs by basis', () => {
    // 0.5 x 771 + 0.5 x 3740; 0.5 x 677 + 0.5 x 3170.
    expect(gwpOf(R32_WITH_R125, 'AR6').value).toBe(2255.5)
    expect(gwpOf(R32_WITH_R125, 'AR5').value).toBe(1923.5)
  })

  it('is unknown, never smaller, where a component has no value, and names the component', () => {
    const { value, because, parts } = gwpOf(WITH_PENTANE, 'AR6')
    expect(value).toBeNull()
    expect(because).toContain('R-601a')
    expect(because).not.toContain('R-134a')
    // 0.994 x 1530 = 1520.8.
    expect(because).toContain('the other 99.4 % of it sum to 1,521')
    expect(parts[1]).toMatchObject({ component: 'R-601a', gwp: null, source: null })
  })

  it('counts a component whose value is zero as zero', () => {
    // 0.994 x 1430 + 0.006 x 0, Annex VI.
    expect(gwpOf(WITH_PENTANE, 'EU-2024/573').value).toBe(1421.42)
  })

  it('has none for an ozone-depleting refrigerant where the basis is a list of HFCs', () => {
    const r22 = { composition: [{ component: 'R-22', massPercent: 100 }] }
    expect(gwpOf(r22, 'exchange-value').value).toBeNull()
    expect(gwpOf(r22, 'EU-2024/573').value).toBeNull()
    expect(gwpOf(r22, 'AR4').value).toBe(1810)
  })

  it('says where a value was never looked up', () => {
    const r1234yf = { composition: [{ component: 'R-1234yf', massPercent: 100 }] }
    expect(gwpOf(r1234yf, 'AR5').fromMemory).toBe(true)
    expect(gwpOf(r1234yf, 'AR6').fromMemory).toBe(false)
  })

  it('is unknown for a refrigerant whose composition is not known', () => {
    expect(gwpOf({ composition: [] }, 'AR4')).toMatchObject({ value: null, because: 'its composition is not known' })
  })

  it('is known on some basis for every refrigerant but one, whose isobutane and HCFCs stand in no list together', () => {
    const without = [...CATALOGUE.refrigerants.values()].filter(one => GWP_BASES.every(basis => gwpOf(one, basis).value === null))
    expect(without.map(one => one.designation)).toEqual(['R-414B'])
  })
})
