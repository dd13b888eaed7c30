/** A row of the hazardous materials table that names a refrigerant. */
export interface ListedEntry { un: string, properShippingName: string, division: Division, judgement?: string }

export type Division = '2.1' | '2.2'

/** Refrigerants with a row of their own. Source: 49 CFR 172.101, hazardous materials table. */
export const LISTED_ENTRIES: Readonly<Record<string, ListedEntry>> = {
  'R-12': { un: 'UN1028', properShippingName: 'Dichlorodifluoromethane or Refrigerant gas R 12', division: '2.2' },
  'R-13': { un: 'UN1022', properShippingName: 'Chlorotrifluoromethane or Refrigerant gas R 13', division: '2.2' },
  'R-22': { un: 'UN1018', properShippingName: 'Chlorodifluoromethane or Refrigerant gas R 22', division: '2.2' },
  'R-23': { un: 'UN1984', properShippingName: 'Trifluoromethane or Refrigerant gas R 23', division: '2.2' },
  'R-32': { un: 'UN3252', properShippingName: 'Difluoromethane or Refrigerant gas R 32', division: '2.1' },
  'R-114': { un: 'UN1958', properShippingName: '1,2-Dichloro-1,1,2,2-tetrafluoroethane or Refrigerant gas R 114', division: '2.2' },
  'R-115': { un: 'UN1020', properShippingName: 'Chloropentafluoroethane or Refrigerant gas R 115', division: '2.2' },
  'R-124': { un: 'UN1021', properShippingName: '1-Chloro-1,2,2,2-tetrafluoroethane or Refrigerant gas R 124', division: '2.2' },
  'R-125': { un: 'UN3220', properShippingName: 'Pentafluoroethane or Refrigerant gas R 125', division: '2.2' },
  'R-134a': { un: 'UN3159', properShippingName: '1,1,1,2-Tetrafluoroethane or Refrigerant gas R 134a', division: '2.2' },
  'R-142b': { un: 'UN2517', properShippingName: '1-Chloro-1,1-difluoroethane or Refrigerant gas R 142b', division: '2.1' },
  'R-143a': { un: 'UN2035', properShippingName: '1,1,1-Trifluoroethane or Refrigerant gas, R 143a', division: '2.1' },
  'R-152a': { un: 'UN1030', properShippingName: '1,1-Difluoroethane or Refrigerant gas R 152a', division: '2.1' },
  'R-227ea': { un: 'UN3296', properShippingName: 'Heptafluoropropane or Refrigerant gas R 227', division: '2.2' },
  'R-404A': { un: 'UN3337', properShippingName: 'Refrigerant gas R 404A', division: '2.2' },
  'R-407A': { un: 'UN3338', properShippingName: 'Refrigerant gas R 407A', division: '2.2' },
  'R-407B': { un: 'UN3339', properShippingName: 'Refrigerant gas R 407B', division: '2.2' },
  'R-407C': { un: 'UN3340', properShippingName: 'Refrigerant gas R 407C', division: '2.2' },
  'R-500': { un: 'UN2602', properShippingName: 'Dichlorodifluoromethane and difluoroethane azeotropic mixture or Refrigerant gas R 500', division: '2.2' },
  'R-502': { un: 'UN1973', properShippingName: 'Chlorodifluoromethane and chloropentafluoroethane mixture or Refrigerant gas R 502', division: '2.2' },
  'R-503': { un: 'UN2599', properShippingName: 'Chlorotrifluoromethane and trifluoromethane azeotropic mixture or Refrigerant gas R 503', division: '2.2' },
  'R-290': {
    un: 'UN1978', properShippingName: 'Propane', division: '2.1',
    judgement: 'Within the United States it may also travel as UN1075, Petroleum gases, liquefied (special provision 19).',
  },
  'R-600': {
    un: 'UN1011', properShippingName: 'Butane', division: '2.1',
    judgement: 'Within the United States it may also travel as UN1075, Petroleum gases, liquefied.',
  },
  'R-600a': {
    un: 'UN1969', properShippingName: 'Isobutane', division: '2.1',
    judgement: 'Within the United States it may also travel as UN1075, Petroleum gases, liquefied.',
  },
  'R-1270': {
    un: 'UN1077', properShippingName: 'Propylene', division: '2.1',
    judgement: 'Within the United States it may also travel as UN1075, Petroleum gases, liquefied.',
  },
  'R-717': {
    un: 'UN1005', properShippingName: 'Ammonia, anhydrous', division: '2.2',
    judgement: 'Paper and package also say "Inhalation Hazard" (special provision 13). Across a border it is Division 2.3 with subsidiary 8.',
  },
  'R-744': { un: 'UN1013', properShippingName: 'Carbon dioxide', division: '2.2' },
}

/** Refrigerants without a row that burn as gases, so far as known; true where the entry was read in a text and not concluded. */
export const FLAMMABLE_UNLISTED: ReadonlyMap<string, { source: string, read: boolean }> = new Map([
  ['R-1234yf', { source: 'PHMSA letter 11-0052, and a trade list for ADR', read: true }],
  ['R-452B', { source: 'a trade list for ADR', read: true }],
  ['R-454A', { source: 'a trade list for ADR', read: true }],
  ['R-454C', { source: 'a trade list for ADR', read: true }],
  ['R-454B', { source: 'by likeness to R-454A', read: false }],
  ['R-455A', { source: 'by likeness to R-454C', read: false }],
  ['R-516A', { source: 'by likeness to R-1234yf', read: false }],
])

/** Refrigerants without a row that are carried as a liquefied gas although their safety class would not say so by itself. */
export const NONFLAMMABLE_UNLISTED: ReadonlyMap<string, { source: string, read: boolean, judgement: string }> = new Map([
  ['R-1234ze(E)', {
    source: 'a trade list for ADR', read: true,
    judgement: 'It does not burn at 68 °F (20 °C), where transport judges it; as a refrigerant it is of class A2L.',
  }],
  ['R-245fa', {
    source: '49 CFR 172.101, which has no row for it', read: false,
    judgement: 'As a refrigerant it is of the more toxic class B1.',
  }],
])

/** What the components are called in words, for an entry that asks for technical names. */
export const CHEMICAL_NAMES: Readonly<Record<string, string>> = {
  'R-12': 'dichlorodifluoromethane', 'R-13': 'chlorotrifluoromethane', 'R-13I1': 'trifluoroiodomethane', 'R-22': 'chlorodifluoromethane', 'R-23': 'trifluoromethane',
  'R-32': 'difluoromethane', 'R-115': 'chloropentafluoroethane', 'R-116': 'hexafluoroethane', 'R-124': '1-chloro-1,2,2,2-tetrafluoroethane',
  'R-125': 'pentafluoroethane', 'R-134a': '1,1,1,2-tetrafluoroethane', 'R-142b': '1-chloro-1,1-difluoroethane', 'R-143a': '1,1,1-trifluoroethane',
  'R-152a': '1,1-difluoroethane', 'R-218': 'octafluoropropane', 'R-227ea': 'heptafluoropropane', 'R-236fa': '1,1,1,3,3,3-hexafluoropropane',
  'R-245fa': '1,1,1,3,3-pentafluoropropane', 'R-290': 'propane', 'R-600': 'butane', 'R-600a': 'isobutane', 'R-601': 'pentane', 'R-601a': 'isopentane',
  'R-744': 'carbon dioxide', 'R-1224yd(Z)': '(Z)-1-chloro-2,3,3,3-tetrafluoropropene', 'R-1233zd(E)': '(E)-1-chloro-3,3,3-trifluoropropene',
  'R-1234yf': '2,3,3,3-tetrafluoropropene', 'R-1234ze(E)': '(E)-1,3,3,3-tetrafluoropropene', 'R-1336mzz(E)': '(E)-1,1,1,4,4,4-hexafluorobut-2-ene',
}
