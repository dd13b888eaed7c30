import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '../../../../utils/refrigerant/allRefrigerants'
import { asListed } from '../../../../utils/refrigerant/designation'

describe('a designation in another case', () => {
  it('is the one of the list, with its small letters', () => {
    expect(asListed('r-134A', ['R-22', 'R-134a'])).toBe('R-134a')
    expect(asListed('R-1234ZE(e)', ['R-1234ze(E)', 'R-1234ze(Z)'])).toBe('R-1234ze(E)')
  })

  it('stays as it is where the list has none of this name', () => {
    expect(asListed('r-9999', ['R-22'])).toBe('r-9999')
    expect(asListed('', ['R-22'])).toBe('')
    expect(asListed('R-134', ['R-134a'])).toBe('R-134')
  })

  it('never stands for two refrigerants', () => {
    const names = [...CATALOGUE.refrigerants.keys(), ...CATALOGUE.compositions.keys()]
    expect(new Set(names.map(name => name.toUpperCase())).size).toBe(names.length)
  })
})
