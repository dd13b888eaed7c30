/** A row of the hazardous materials table that names a refrigerant. */
export interface ListedEntry {
  un: string
  /** As the row has it, with the names between which the shipper chooses. */
  row: string
  division: Division
  subsidiary?: readonly ('2.1' | '8')[]
  /** What the paper says with the description. */
  words?: readonly string[]
  judgement?: string
}

/** 2.1 burns, 2.2 does neither burn nor poison, 2.3 poisons by inhalation. */
export type Division = '2.1' | '2.2' | '2.3'

const POISONOUS = 'The paper also gives its hazard zone with the words “Poison-Inhalation Hazard” (49 CFR 172.203(m)): the shipper adds them.'

/** Refrigerants with a row of their own. Source: 49 CFR 172.101, hazardous materials table. */
export const LISTED_ENTRIES: Readonly<Record<string, ListedEntry>> = {
  'R-12': { un: 'UN1028', row: 'Dichlorodifluoromethane or Refrigerant gas R 12', division: '2.2' },
  'R-12B1': { un: 'UN1974', row: 'Chlorodifluorobromomethane or Refrigerant gas R 12B1', division: '2.2' },
  'R-13': { un: 'UN1022', row: 'Chlorotrifluoromethane or Refrigerant gas R 13', division: '2.2' },
  'R-13B1': { un: 'UN1009', row: 'Bromotrifluoromethane or Refrigerant gas, R 13B1', division: '2.2' },
  'R-14': { un: 'UN1982', row: 'Tetrafluoromethane or Refrigerant gas R 14', division: '2.2' },
  'R-21': { un: 'UN1029', row: 'Dichlorofluoromethane or Refrigerant gas R21', division: '2.2' },
  'R-22': { un: 'UN1018', row: 'Chlorodifluoromethane or Refrigerant gas R 22', division: '2.2' },
  'R-23': { un: 'UN1984', row: 'Trifluoromethane or Refrigerant gas R 23', division: '2.2' },
  'R-32': { un: 'UN3252', row: 'Difluoromethane or Refrigerant gas R 32', division: '2.1' },
  'R-40': { un: 'UN1063', row: 'Methyl chloride or Refrigerant gas R 40', division: '2.1' },
  'R-41': { un: 'UN2454', row: 'Methyl fluoride, or Refrigerant gas R 41', division: '2.1' },
  'R-114': { un: 'UN1958', row: '1,2-Dichloro-1,1,2,2-tetrafluoroethane or Refrigerant gas R 114', division: '2.2' },
  'R-115': { un: 'UN1020', row: 'Chloropentafluoroethane or Refrigerant gas R 115', division: '2.2' },
  'R-116': { un: 'UN2193', row: 'Hexafluoroethane, or Refrigerant gas R 116', division: '2.2' },
  'R-124': { un: 'UN1021', row: '1-Chloro-1,2,2,2-tetrafluoroethane or Refrigerant gas R 124', division: '2.2' },
  'R-125': { un: 'UN3220', row: 'Pentafluoroethane or Refrigerant gas R 125', division: '2.2' },
  'R-133a': { un: 'UN1983', row: '1-Chloro-2,2,2-trifluoroethane or Refrigerant gas R 133a', division: '2.2' },
  'R-134a': { un: 'UN3159', row: '1,1,1,2-Tetrafluoroethane or Refrigerant gas R 134a', division: '2.2' },
  'R-142b': { un: 'UN2517', row: '1-Chloro-1,1-difluoroethane or Refrigerant gas R 142b', division: '2.1' },
  'R-143a': { un: 'UN2035', row: '1,1,1-Trifluoroethane or Refrigerant gas, R 143a', division: '2.1' },
  'R-152a': { un: 'UN1030', row: '1,1-Difluoroethane or Refrigerant gas R 152a', division: '2.1' },
  'R-161': { un: 'UN2453', row: 'Ethyl fluoride or Refrigerant gas R161', division: '2.1' },
  'R-170': { un: 'UN1035', row: 'Ethane', division: '2.1' },
  'R-218': { un: 'UN2424', row: 'Octafluoropropane or Refrigerant gas R 218', division: '2.2' },
  'R-227ea': { un: 'UN3296', row: 'Heptafluoropropane or Refrigerant gas R 227', division: '2.2' },
  'RC-318': { un: 'UN1976', row: 'Octafluorocyclobutane, or Refrigerant gas RC 318', division: '2.2' },
  'R-1132a': { un: 'UN1959', row: '1,1-Difluoroethylene or Refrigerant gas R 1132a', division: '2.1' },
  'R-1216': { un: 'UN1858', row: 'Hexafluoropropylene compressed or Refrigerant gas R 1216', division: '2.2' },
  'R-1318': { un: 'UN2422', row: 'Octafluorobut-2-ene or Refrigerant gas R 1318', division: '2.2' },
  'R-404A': { un: 'UN3337', row: 'Refrigerant gas R 404A', division: '2.2' },
  'R-407A': { un: 'UN3338', row: 'Refrigerant gas R 407A', division: '2.2' },
  'R-407B': { un: 'UN3339', row: 'Refrigerant gas R 407B', division: '2.2' },
  'R-407C': { un: 'UN3340', row: 'Refrigerant gas R 407C', division: '2.2' },
  'R-500': { un: 'UN2602', row: 'Dichlorodifluoromethane and difluoroethane azeotropic mixture or Refrigerant gas R 500', division: '2.2' },
  'R-502': { un: 'UN1973', row: 'Chlorodifluoromethane and chloropentafluoroethane mixture or Refrigerant gas R 502', division: '2.2' },
  'R-503': { un: 'UN2599', row: 'Chlorotrifluoromethane and trifluoromethane azeotropic mixture or Refrigerant gas R 503', division: '2.2' },
  'R-290': {
    un: 'UN1978', row: 'Propane', division: '2.1',
    judgement: 'Within the United States it may also travel as UN1075, Petroleum gases, liquefied (special provision 19).',
  },
  'R-600': {
    un: 'UN1011', row: 'Butane', division: '2.1',
    judgement: 'Within the United States it may also travel as UN1075, Petroleum gases, liquefied.',
  },
  'R-600a': {
    un: 'UN1969', row: 'Isobutane', division: '2.1',
    judgement: 'Within the United States it may also travel as UN1075, Petroleum gases, liquefied.',
  },
  'R-1270': {
    un: 'UN1077', row: 'Propylene', division: '2.1',
    judgement: 'Within the United States it may also travel as UN1075, Petroleum gases, liquefied.',
  },
  'R-717': {
    un: 'UN1005', row: 'Ammonia, anhydrous', division: '2.2', words: ['Inhalation Hazard'],
    judgement: 'Paper and package also say "Inhalation Hazard" (special provision 13). Across a border it is Division 2.3 with subsidiary 8.',
  },
  'R-744': { un: 'UN1013', row: 'Carbon dioxide', division: '2.2' },
  'R-764': { un: 'UN1079', row: 'Sulfur dioxide', division: '2.3', subsidiary: ['8'], judgement: POISONOUS },
  'R-1113': { un: 'UN1082', row: 'Trifluorochloroethylene, stabilized or Refrigerant gas R 1113', division: '2.3', subsidiary: ['2.1'], judgement: POISONOUS },
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
  'R-11': 'trichlorofluoromethane', 'R-113': '1,1,2-trichloro-1,2,2-trifluoroethane', 'R-114': '1,2-dichloro-1,1,2,2-tetrafluoroethane',
  'R-123': '2,2-dichloro-1,1,1-trifluoroethane', 'R-1270': 'propylene', 'R-1336mzz(Z)': '(Z)-1,1,1,4,4,4-hexafluorobut-2-ene',
  'R-12': 'dichlorodifluoromethane', 'R-13': 'chlorotrifluoromethane', 'R-13I1': 'trifluoroiodomethane', 'R-22': 'chlorodifluoromethane', 'R-23': 'trifluoromethane',
  'R-32': 'difluoromethane', 'R-115': 'chloropentafluoroethane', 'R-116': 'hexafluoroethane', 'R-124': '1-chloro-1,2,2,2-tetrafluoroethane',
  'R-125': 'pentafluoroethane', 'R-134a': '1,1,1,2-tetrafluoroethane', 'R-142b': '1-chloro-1,1-difluoroethane', 'R-143a': '1,1,1-trifluoroethane',
  'R-152a': '1,1-difluoroethane', 'R-218': 'octafluoropropane', 'R-227ea': 'heptafluoropropane', 'R-236fa': '1,1,1,3,3,3-hexafluoropropane',
  'R-245fa': '1,1,1,3,3-pentafluoropropane', 'R-290': 'propane', 'R-600': 'butane', 'R-600a': 'isobutane', 'R-601': 'pentane', 'R-601a': 'isopentane',
  'R-744': 'carbon dioxide', 'R-1224yd(Z)': '(Z)-1-chloro-2,3,3,3-tetrafluoropropene', 'R-1233zd(E)': '(E)-1-chloro-3,3,3-trifluoropropene',
  'R-1234yf': '2,3,3,3-tetrafluoropropene', 'R-1234ze(E)': '(E)-1,3,3,3-tetrafluoropropene', 'R-1336mzz(E)': '(E)-1,1,1,4,4,4-hexafluorobut-2-ene',
}
