import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { noUnEntryBecause, unEntryOf } from '~~/utils/refrigerant/unEntry'
import type { Refrigerant } from '~~/utils/refrigerant/types'

describe('the transport entry of a refrigerant', () => {
  // 49 CFR 172.101, hazardous materials table.
  it.each([
    ['R-22', 'UN1018', '2.2'], ['R-134a', 'UN3159', '2.2'], ['R-404A', 'UN3337', '2.2'], ['R-407C', 'UN3340', '2.2'],
    ['R-32', 'UN3252', '2.1'], ['R-143a', 'UN2035', '2.1'], ['R-290', 'UN1978', '2.1'], ['R-717', 'UN1005', '2.2'], ['R-744', 'UN1013', '2.2'],
  ])('%s has a row of its own: %s, Division %s', (designation, un, division) => {
    expect(unEntryOf(refrigerant(designation))).toMatchObject({ un, division, status: 'read' })
  })

  it('leaves nothing to judge where the row names the refrigerant alone', () => {
    expect(unEntryOf(refrigerant('R-22'))?.judgement).toBeNull()
    expect(unEntryOf(refrigerant('R-717'))?.judgement).toContain('2.3')
  })

  it('names a blend without a row by its two largest components and leaves the choice to the shipper', () => {
    const entry = unEntryOf(refrigerant('R-410A'))
    expect(entry).toMatchObject({ un: 'UN1078', division: '2.2', status: 'from-memory' })
    expect(entry?.properShippingName).toBe('Refrigerant gases, n.o.s. (difluoromethane, pentafluoroethane)')
    expect(entry?.judgement).toContain('shipper')
  })

  // A trade list for ADR names R-454A, R-454C and R-452B so.
  it.each(['R-454A', 'R-454C', 'R-452B', 'R-454B', 'R-455A'])('%s burns and names its flammable parts', (designation) => {
    const entry = unEntryOf(refrigerant(designation))
    expect(entry).toMatchObject({ un: 'UN3161', division: '2.1' })
    expect(entry?.properShippingName).toMatch(/difluoromethane/)
    expect(entry?.properShippingName).toMatch(/2,3,3,3-tetrafluoropropene/)
  })

  it('carries R-1234ze(E) as non-flammable although its safety class is A2L', () => {
    expect(unEntryOf(refrigerant('R-1234ze(E)'))).toMatchObject({ un: 'UN3163', division: '2.2', status: 'read' })
  })

  it.each(['R-11', 'R-113', 'R-123', 'R-1336mzz(Z)', 'R-514A'])('%s boils above 68 °F and has no entry as a gas', (designation) => {
    expect(unEntryOf(refrigerant(designation))).toBeNull()
    expect(noUnEntryBecause(refrigerant(designation))).toContain('68 °F')
  })

  it('has an entry for R-1233zd(E), which boils just below 68 °F', () => {
    expect(unEntryOf(refrigerant('R-1233zd(E)'))).toMatchObject({ un: 'UN1078', division: '2.2' })
  })

  it('suggests none for R-413A, whose vapor may burn after a leak', () => {
    expect(unEntryOf(refrigerant('R-413A'))).toBeNull()
    expect(noUnEntryBecause(refrigerant('R-413A'))).toContain('shipper')
  })

  it('calls nothing that burns in Division 2.2, save what transport judges not to burn', () => {
    const burning = [...CATALOGUE.refrigerants.values()].filter(one => /^[AB](2|3)/.test(one.safetyClass ?? ''))
    expect(burning.filter(one => unEntryOf(one)?.division === '2.2').map(one => one.designation)).toEqual(['R-717', 'R-1234ze(E)'])
  })

  it('suggests none for a blend whose safety class is not held', () => {
    const blend = { designation: 'R-406A', safetyClass: null, composition: [{ component: 'R-22', massPercent: 55 }, { component: 'R-142b', massPercent: 45 }] }
    expect(unEntryOf(blend)).toBeNull()
  })
})

function refrigerant(designation: string): Refrigerant {
  const found = CATALOGUE.refrigerants.get(designation)
  if (!found) throw new Error(`No ${designation}`)
  return found
}
