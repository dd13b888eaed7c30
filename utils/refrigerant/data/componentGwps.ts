import type { GwpBasis } from '../gwp'

/** How well a figure is known: read in its text, reported by another text that names it, or from memory. */
export type HowKnown = 'read' | 'reported' | 'from memory'

/** Values of one basis that share a source. Units: kg of CO2 for one kg over 100 years, by component. */
export interface GwpGroup { source: string, known: HowKnown, values: Readonly<Record<string, number>> }

const AR4_HFCS = {
  'R-23': 14_800, 'R-32': 675, 'R-125': 3_500, 'R-134a': 1_430, 'R-143a': 4_470, 'R-152a': 124, 'R-227ea': 3_220, 'R-236fa': 9_810, 'R-245fa': 1_030,
}

// A GWP is told against that of carbon dioxide.
const CARBON_DIOXIDE: GwpGroup = { source: '1 by definition', known: 'read', values: { 'R-744': 1 } }

/**
 * The 100-year GWP of every component that a basis has a value for, each with its source.
 *
 * A component that is in no group of a basis has no value there; its absence is never a zero.
 */
export const COMPONENT_GWPS: Readonly<Record<GwpBasis, readonly GwpGroup[]>> = {
  'AR4': [
    {
      source: 'IPCC AR4 WG I (2007), Table 2.14', known: 'reported',
      values: {
        'R-11': 4_750, 'R-12': 10_900, 'R-13': 14_400, 'R-113': 6_130, 'R-114': 10_000, 'R-115': 7_370,
        'R-22': 1_810, 'R-123': 77, 'R-124': 609, 'R-142b': 2_310, ...AR4_HFCS, 'R-116': 12_200, 'R-218': 8_830,
      },
    },
    { source: 'IPCC AR4 WG I (2007), Table 2.15 (indirect)', known: 'from memory', values: { 'R-290': 3.3, 'R-600': 4, 'R-1270': 1.8 } },
    { source: '0.4 as commonly printed; the report was not read', known: 'from memory', values: { 'R-13I1': 0.4 } },
    CARBON_DIOXIDE,
  ],
  'AR5': [
    {
      source: 'IPCC AR5 WG I (2013), Table 8.A.1, without carbon feedback', known: 'reported',
      values: {
        'R-11': 4_660, 'R-12': 10_200, 'R-13': 13_900, 'R-113': 5_820, 'R-114': 8_590, 'R-115': 7_670,
        'R-22': 1_760, 'R-123': 79, 'R-124': 527, 'R-142b': 1_980,
        'R-23': 12_400, 'R-32': 677, 'R-125': 3_170, 'R-134a': 1_300, 'R-143a': 4_800, 'R-152a': 138, 'R-227ea': 3_350, 'R-236fa': 8_060, 'R-245fa': 858,
        'R-116': 11_100, 'R-218': 8_900, 'R-1233zd(E)': 1,
      },
    },
    { source: 'IPCC AR5 WG I (2013), Table 8.A.1', known: 'from memory', values: { 'R-1336mzz(Z)': 2 } },
    { source: 'IPCC AR5 WG I (2013), Table 8.A.1: below 1, counted as 1', known: 'from memory', values: { 'R-1234yf': 1, 'R-1234ze(E)': 1 } },
    CARBON_DIOXIDE,
  ],
  'AR6': [
    {
      source: 'IPCC AR6 WG I (2021), Table 7.SM.7', known: 'read',
      values: {
        'R-11': 6_230, 'R-12': 12_500, 'R-13': 16_200, 'R-113': 6_520, 'R-114': 9_430, 'R-115': 9_600,
        'R-22': 1_960, 'R-123': 90.4, 'R-124': 597, 'R-142b': 2_300,
        'R-23': 14_600, 'R-32': 771, 'R-125': 3_740, 'R-134a': 1_530, 'R-143a': 5_810, 'R-152a': 164, 'R-227ea': 3_600, 'R-236fa': 8_690, 'R-245fa': 962,
        'R-116': 12_400, 'R-218': 9_290,
        'R-1234yf': 0.501, 'R-1234ze(E)': 1.37, 'R-1233zd(E)': 3.88, 'R-1336mzz(E)': 17.9, 'R-1336mzz(Z)': 2.08,
        'R-290': 0.02, 'R-600': 0.006,
      },
    },
    CARBON_DIOXIDE,
  ],
  'exchange-value': [
    { source: '42 USC 7675(c), by 40 CFR 84.64(a)', known: 'read', values: AR4_HFCS },
    { source: '40 CFR 84.64(b)', known: 'read', values: { 'R-1233zd(E)': 4, 'R-1224yd(Z)': 1, 'R-1130(E)': 5 } },
    { source: '40 CFR 84.64(b)', known: 'from memory', values: { 'R-1234yf': 1, 'R-1234ze(E)': 1, 'R-1336mzz(Z)': 2 } },
    {
      source: '40 CFR 84.64(b)', known: 'reported',
      values: { 'R-290': 3.3, 'R-600': 4, 'R-600a': 1, 'R-1270': 1.8, 'R-717': 1, 'R-744': 1 },
    },
    {
      source: '40 CFR 84.64(b), light saturated hydrocarbons: 1 to 4, the upper end taken', known: 'reported',
      values: { 'R-601': 4, 'R-601a': 4 },
    },
  ],
  'EU-2024/573': [
    { source: 'Regulation (EU) 2024/573, Annex I section 1', known: 'read', values: AR4_HFCS },
    { source: 'Regulation (EU) 2024/573, Annex I section 2', known: 'read', values: { 'R-116': 12_400, 'R-218': 9_290 } },
    {
      source: 'Regulation (EU) 2024/573, Annex II', known: 'read',
      values: {
        'R-1234yf': 0.501, 'R-1234ze(E)': 1.37, 'R-1336mzz(E)': 17.9, 'R-1336mzz(Z)': 2.08, 'R-1233zd(E)': 3.88, 'R-1224yd(Z)': 0.06,
      },
    },
    {
      source: 'Regulation (EU) 2024/573, Annex VI', known: 'read',
      values: { 'R-290': 0.02, 'R-600': 0.006, 'R-600a': 0, 'R-601': 0, 'R-601a': 0, 'R-1270': 0, 'R-717': 0 },
    },
    CARBON_DIOXIDE,
  ],
  'EU-517/2014': [
    { source: 'Regulation (EU) No 517/2014, Annex I (the values of IPCC AR4)', known: 'reported', values: { ...AR4_HFCS, 'R-116': 12_200, 'R-218': 8_830 } },
    {
      source: 'Regulation (EU) No 517/2014, as Real Decreto 552/2019, IF-02, Table A gives its values', known: 'reported',
      values: {
        'R-1234yf': 4, 'R-1234ze(E)': 7, 'R-1233zd(E)': 4.5, 'R-1336mzz(Z)': 2, 'R-290': 3, 'R-600': 4, 'R-600a': 3, 'R-1270': 2, 'R-717': 0,
      },
    },
    CARBON_DIOXIDE,
  ],
}

/** Why components may be without a value, by basis; it follows their names. */
export const WHY_NO_GWP: Readonly<Record<GwpBasis, string>> = {
  'AR4': 'without a value in the tables of the fourth report',
  'AR5': 'without a value in the table of the fifth report',
  'AR6': 'without a value in the table of the sixth report',
  'exchange-value': 'not among the regulated HFCs, and no value of 40 CFR 84.64(b) is held',
  'EU-2024/573': 'not under this regulation, or no value of its annexes is held',
  'EU-517/2014': 'not under this regulation, or no value of its annexes is held',
}
