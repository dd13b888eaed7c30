import type { FillingDensityRow, HydrocarbonBand } from '../types'

/**
 * Filling densities of the gases that the table names, row by row.
 *
 * Source: 49 CFR 173.304a(a)(2). The rows "refrigerant gas, n.o.s." and "liquefied nonflammable gases" name no gas
 * and never decide.
 */
export const FILLING_DENSITY_ROWS: readonly FillingDensityRow[] = [
  {
    designation: 'R-717',
    gas: 'Anhydrous ammonia',
    percent: 54,
    specs: ['3A480', '3AA480', '3A480X', '4AA480', '3', '3E1800', '3AL480'],
  },
  {
    designation: 'R-13B1',
    gas: 'Bromotrifluoromethane',
    percent: 124,
    specs: ['3A400', '3AA400', '3B400', '4AA480', '4B400', '4BA400', '4BW400', '3E1800', '39', '3AL400'],
  },
  {
    designation: 'R-744',
    gas: 'Carbon dioxide',
    percent: 68,
    specs: ['3A1800', '3AX1800', '3AA1800', '3AAX1800', '3', '3E1800', '3T1800', '3HT2000', '39', '3AL1800'],
  },
  {
    designation: 'R-744',
    gas: 'Carbon dioxide',
    percent: 70.3,
    specs: ['3A2000', '3AA2000', '3AX2000', '3AAX2000', '3T2000'],
  },
  {
    designation: 'R-744',
    gas: 'Carbon dioxide',
    percent: 73.2,
    specs: ['3A2265', '3AA2265', '3AX2265', '3AAX2265', '3T2265'],
  },
  {
    designation: 'R-744',
    gas: 'Carbon dioxide',
    percent: 74.5,
    specs: ['3A2400', '3AA2400', '3AX2400', '3AAX2400', '3T2400'],
  },
  {
    designation: 'R-142b',
    gas: '1-Chloro-1,1-difluoroethane',
    percent: 100,
    specs: ['3A150', '3AA150', '3B150', '4B150', '4BA225', '4BW225', '3E1800', '39', '3AL150'],
  },
  {
    designation: 'R-22',
    gas: 'Chlorodifluoromethane',
    percent: 105,
    specs: ['3A240', '3AA240', '3B240', '4B240', '4BA240', '4BW240', '4B240ET', '4E240', '39', '3E1800', '3AL240'],
  },
  {
    designation: 'R-115',
    gas: 'Chloropentafluoroethane',
    percent: 110,
    specs: ['3A225', '3AA225', '3B225', '4BA225', '4B225', '4BW225', '3E1800', '39', '3AL225'],
  },
  {
    designation: 'R-13',
    gas: 'Chlorotrifluoromethane',
    percent: 100,
    specs: ['3A1800', '3AA1800', '3', '3E1800', '39', '3AL1800'],
  },
  {
    designation: 'RC-270',
    gas: 'Cyclopropane',
    percent: 55,
    specs: ['3A225', '3A480X', '3AA225', '3B225', '4AA480', '4B225', '4BA225', '4BW225', '4B240ET', '3', '3E1800', '39', '3AL225'],
  },
  {
    designation: 'R-12',
    gas: 'Dichlorodifluoromethane',
    percent: 119,
    specs: ['3A225', '3AA225', '3B225', '4B225', '4BA225', '4BW225', '4B240ET', '4E225', '39', '3E1800', '3AL225'],
  },
  {
    designation: 'R-500',
    gas: 'Dichlorodifluoromethane and difluoroethane azeotrope',
    percent: null,
    specs: ['3A240', '3AA240', '3B240', '3E1800', '4B240', '4BA240', '4BW240', '4E240', '39'],
  },
  {
    designation: 'R-152a',
    gas: '1,1-Difluoroethane',
    percent: 79,
    specs: ['3A150', '3AA150', '3B150', '4B150', '4BA225', '4BW225', '3E1800', '3AL150'],
  },
  {
    designation: 'R-1132a',
    gas: '1,1-Difluoroethylene',
    percent: 73,
    specs: ['3A2200', '3AA2200', '3AX2200', '3AAX2200', '3T2200', '39'],
  },
  {
    designation: 'R-170',
    gas: 'Ethane',
    percent: 35.8,
    specs: ['3A1800', '3AX1800', '3AA1800', '3AAX1800', '3', '3E1800', '3T1800', '39', '3AL1800'],
  },
  {
    designation: 'R-170',
    gas: 'Ethane',
    percent: 36.8,
    specs: ['3A2000', '3AX2000', '3AA2000', '3AAX2000', '3T2000', '39', '3AL2000'],
  },
  {
    designation: 'R-1150',
    gas: 'Ethylene',
    percent: 31,
    specs: ['3A1800', '3AX1800', '3AA1800', '3AAX1800', '3', '3E1800', '3T1800', '39', '3AL1800'],
  },
  {
    designation: 'R-1150',
    gas: 'Ethylene',
    percent: 32.5,
    specs: ['3A2000', '3AX2000', '3AA2000', '3AAX2000', '3T2000', '39', '3AL2000'],
  },
  {
    designation: 'R-1150',
    gas: 'Ethylene',
    percent: 35.5,
    specs: ['3A2400', '3AX2400', '3AA2400', '3AAX2400', '3T2400', '39', '3AL2400'],
  },
  {
    designation: 'R-40',
    gas: 'Methyl chloride',
    percent: 84,
    specs: ['3', '3A225', '3AA225', '3B225', '3E1800', '4B225', '4BA225', '4BW225', '4B240ET'],
  },
  {
    designation: 'R-764',
    gas: 'Sulfur dioxide',
    percent: 125,
    specs: ['3', '3A225', '3AA225', '3AL225', '3B225', '3E1800', '4B225', '4BA225', '4BW225', '4B240ET', '39'],
  },
  {
    designation: 'R-1113',
    gas: 'Trifluorochloroethylene, stabilized',
    percent: 115,
    specs: ['3A300', '3AA300', '3B300', '3E1800', '4B300', '4BA300', '4BW300'],
  },
]

/** Specifications authorised for liquefied gases in general. Source: 49 CFR 173.304a(a)(1). */
export const LIQUEFIED_GAS_SPECS: readonly string[] = [
  'DOT-3', 'DOT-3A', 'DOT-3AA', 'DOT-3AL', 'DOT-3B', 'DOT-3BN', 'DOT-3E',
  'DOT-4B', 'DOT-4BA', 'DOT-4B240ET', 'DOT-4BW', 'DOT-4E', 'DOT-39',
]

/** Refrigerants of the catalogue that are liquefied hydrocarbon gases. */
export const HYDROCARBONS: readonly string[] = ['R-290', 'R-600', 'R-600a', 'R-1270']

/** Filling densities of liquefied hydrocarbon gases by specific gravity at 60 F. Source: 49 CFR 173.304a(d)(1). */
export const HYDROCARBON_BANDS: readonly HydrocarbonBand[] = [
  { fromThousandths: 271, toThousandths: 289, percent: 26 },
  { fromThousandths: 290, toThousandths: 306, percent: 27 },
  { fromThousandths: 307, toThousandths: 322, percent: 28 },
  { fromThousandths: 323, toThousandths: 338, percent: 29 },
  { fromThousandths: 339, toThousandths: 354, percent: 30 },
  { fromThousandths: 355, toThousandths: 371, percent: 31 },
  { fromThousandths: 372, toThousandths: 398, percent: 32 },
  { fromThousandths: 399, toThousandths: 425, percent: 33 },
  { fromThousandths: 426, toThousandths: 440, percent: 34 },
  { fromThousandths: 441, toThousandths: 452, percent: 35 },
  { fromThousandths: 453, toThousandths: 462, percent: 36 },
  { fromThousandths: 463, toThousandths: 472, percent: 37 },
  { fromThousandths: 473, toThousandths: 480, percent: 38 },
  { fromThousandths: 481, toThousandths: 488, percent: 39 },
  { fromThousandths: 489, toThousandths: 495, percent: 40 },
  { fromThousandths: 496, toThousandths: 503, percent: 41 },
  { fromThousandths: 504, toThousandths: 510, percent: 42 },
  { fromThousandths: 511, toThousandths: 519, percent: 43 },
  { fromThousandths: 520, toThousandths: 527, percent: 44 },
  { fromThousandths: 528, toThousandths: 536, percent: 45 },
  { fromThousandths: 537, toThousandths: 544, percent: 46 },
  { fromThousandths: 545, toThousandths: 552, percent: 47 },
  { fromThousandths: 553, toThousandths: 560, percent: 48 },
  { fromThousandths: 561, toThousandths: 568, percent: 49 },
  { fromThousandths: 569, toThousandths: 576, percent: 50 },
  { fromThousandths: 577, toThousandths: 584, percent: 51 },
  { fromThousandths: 585, toThousandths: 592, percent: 52 },
  { fromThousandths: 593, toThousandths: 600, percent: 53 },
  { fromThousandths: 601, toThousandths: 608, percent: 54 },
  { fromThousandths: 609, toThousandths: 617, percent: 55 },
  { fromThousandths: 618, toThousandths: 626, percent: 56 },
  { fromThousandths: 627, toThousandths: 634, percent: 57 },
]
