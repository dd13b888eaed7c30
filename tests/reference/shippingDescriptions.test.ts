import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { shippingDescription } from '~~/utils/transport/shippingDescription'

// The hazardous materials table of 49 CFR 172.101, as of 1 June 2026: columns 2 (name), 3 (division), 4 (number) and 6
// (labels; the subsidiary ones stand in parentheses). Where a row joins names by "or", any one is the name
// (172.101(c)(2)); here it is the one with the number of the refrigerant. The order is that of 172.202(a)(1) to (4).
const TABLE: [designation: string, description: string][] = [
  ['R-12', 'UN1028, Refrigerant gas R 12, 2.2'],
  ['R-12B1', 'UN1974, Refrigerant gas R 12B1, 2.2'],
  ['R-13', 'UN1022, Refrigerant gas R 13, 2.2'],
  ['R-13B1', 'UN1009, Refrigerant gas, R 13B1, 2.2'],
  ['R-14', 'UN1982, Refrigerant gas R 14, 2.2'],
  ['R-21', 'UN1029, Refrigerant gas R21, 2.2'],
  ['R-22', 'UN1018, Refrigerant gas R 22, 2.2'],
  ['R-23', 'UN1984, Refrigerant gas R 23, 2.2'],
  ['R-32', 'UN3252, Refrigerant gas R 32, 2.1'],
  ['R-40', 'UN1063, Refrigerant gas R 40, 2.1'],
  ['R-41', 'UN2454, Refrigerant gas R 41, 2.1'],
  ['R-114', 'UN1958, Refrigerant gas R 114, 2.2'],
  ['R-115', 'UN1020, Refrigerant gas R 115, 2.2'],
  ['R-116', 'UN2193, Refrigerant gas R 116, 2.2'],
  ['R-124', 'UN1021, Refrigerant gas R 124, 2.2'],
  ['R-125', 'UN3220, Refrigerant gas R 125, 2.2'],
  ['R-133a', 'UN1983, Refrigerant gas R 133a, 2.2'],
  ['R-134a', 'UN3159, Refrigerant gas R 134a, 2.2'],
  ['R-142b', 'UN2517, Refrigerant gas R 142b, 2.1'],
  ['R-143a', 'UN2035, Refrigerant gas, R 143a, 2.1'],
  ['R-152a', 'UN1030, Refrigerant gas R 152a, 2.1'],
  ['R-161', 'UN2453, Refrigerant gas R161, 2.1'],
  ['R-170', 'UN1035, Ethane, 2.1'],
  ['R-218', 'UN2424, Refrigerant gas R 218, 2.2'],
  ['R-227ea', 'UN3296, Refrigerant gas R 227, 2.2'],
  ['RC-318', 'UN1976, Refrigerant gas RC 318, 2.2'],
  ['R-290', 'UN1978, Propane, 2.1'],
  ['R-404A', 'UN3337, Refrigerant gas R 404A, 2.2'],
  ['R-407A', 'UN3338, Refrigerant gas R 407A, 2.2'],
  ['R-407B', 'UN3339, Refrigerant gas R 407B, 2.2'],
  ['R-407C', 'UN3340, Refrigerant gas R 407C, 2.2'],
  ['R-500', 'UN2602, Refrigerant gas R 500, 2.2'],
  ['R-502', 'UN1973, Refrigerant gas R 502, 2.2'],
  ['R-503', 'UN2599, Refrigerant gas R 503, 2.2'],
  ['R-600', 'UN1011, Butane, 2.1'],
  ['R-600a', 'UN1969, Isobutane, 2.1'],
  ['R-717', 'UN1005, Ammonia, anhydrous, 2.2, Inhalation Hazard'],
  ['R-744', 'UN1013, Carbon dioxide, 2.2'],
  ['R-764', 'UN1079, Sulfur dioxide, 2.3 (8)'],
  ['R-1113', 'UN1082, Refrigerant gas R 1113, 2.3 (2.1)'],
  ['R-1132a', 'UN1959, Refrigerant gas R 1132a, 2.1'],
  ['R-1216', 'UN1858, Refrigerant gas R 1216, 2.2'],
  ['R-1270', 'UN1077, Propylene, 2.1'],
  ['R-1318', 'UN2422, Refrigerant gas R 1318, 2.2'],
]

// No row names them. Number and division as in the texts named; the rest is the shipper's judgement (49 CFR 173.22).
const WITHOUT_A_ROW: [designation: string, description: string, source: string, isRead: boolean][] = [
  ['R-1234yf', 'UN3161, Liquefied gas, flammable, n.o.s. (2,3,3,3-tetrafluoropropene), 2.1', 'PHMSA letter 11-0052', true],
  ['R-1234ze(E)', 'UN3163, Liquefied gas, n.o.s. ((E)-1,3,3,3-tetrafluoropropene), 2.2', 'trade list for ADR', true],
  ['R-452B', 'UN3161, Liquefied gas, flammable, n.o.s. (difluoromethane, 2,3,3,3-tetrafluoropropene), 2.1', 'trade list for ADR', true],
  ['R-454C', 'UN3161, Liquefied gas, flammable, n.o.s. (2,3,3,3-tetrafluoropropene, difluoromethane), 2.1', 'trade list for ADR', true],
  ['R-454B', 'UN3161, Liquefied gas, flammable, n.o.s. (difluoromethane, 2,3,3,3-tetrafluoropropene), 2.1', 'by likeness', false],
  ['R-410A', 'UN1078, Refrigerant gases, n.o.s. (difluoromethane, pentafluoroethane), 2.2', '49 CFR 173.115(j); the choice from memory', false],
  // By mass: 26 R-32, 26 R-125, 20 R-1234yf, 21 R-134a, 7 R-1234ze(E).
  ['R-448A', 'UN1078, Refrigerant gases, n.o.s. (difluoromethane, pentafluoroethane), 2.2', 'the choice from memory', false],
  // 50 R-125, 50 R-143a by mass.
  ['R-507A', 'UN1078, Refrigerant gases, n.o.s. (pentafluoroethane, 1,1,1-trifluoroethane), 2.2', 'the choice from memory', false],
  // 56 R-1234yf, 44 R-134a by mass.
  ['R-513A', 'UN1078, Refrigerant gases, n.o.s. (2,3,3,3-tetrafluoropropene, 1,1,1,2-tetrafluoroethane), 2.2', 'the choice from memory', false],
]

describe('the basic description of a refrigerant on a shipping paper', () => {
  it.each(TABLE)('%s is %s', (designation, description) => {
    const told = described(designation)
    expect(told.text).toBe(description)
    expect(told).toMatchObject({ basis: 'listed', source: '49 CFR 172.101', needsChoice: false })
  })

  it.each(WITHOUT_A_ROW)('%s, which no row names, is %s', (designation, description, _source, isRead) => {
    const told = described(designation)
    expect(told.text).toBe(description)
    expect(told.basis).toBe(isRead ? 'judgement' : 'from-memory')
    expect(told.because).toContain('49 CFR 173.22')
  })

  it('gives no gas a packing group', () => {
    expect(TABLE.map(([designation]) => described(designation).text).filter(text => /PG|\bI{1,3}\b/.test(text))).toEqual([])
  })

  // 49 CFR 172.102, special provision 13: these words on paper and package of ammonia within the United States.
  it('adds its words to ammonia, and says what it is across a border', () => {
    expect(described('R-717')).toMatchObject({ words: ['Inhalation Hazard'] })
    expect(described('R-717').because).toContain('2.3')
  })

  // 49 CFR 172.102, special provision 19.
  it.each(['R-290', 'R-600', 'R-600a', 'R-1270'])('says of %s that UN1075 is open within the United States', (designation) => {
    expect(described(designation).because).toContain('UN1075')
  })

  // Boiling above 20 °C, and below 300 kPa at 50 °C: no gas (49 CFR 171.8, 173.115). R-113 at 47.6, R-123 at 27.8, R-11 at 23.7 °C.
  it.each(['R-11', 'R-113', 'R-123'])('has no description of %s as a gas, and asks its shipper', (designation) => {
    expect(described(designation)).toMatchObject({ identification: null, text: 'Not classified', needsChoice: true })
    expect(described(designation).because).toContain('does not travel as a gas')
  })
})

function described(designation: string) {
  return shippingDescription({ refrigerant: designation, condition: 'clean', knownParts: [designation], nothingInIt: false }, CATALOGUE)
}
