import type { Curve } from './monotoneCurve'

/** Saturation of a refrigerant at one temperature, as computed from its equation of state. Units: C, kPa absolute, kg/m3. */
export type SaturationRow = {
  tC: number
  bubblePressureKPa: number
  dewPressureKPa: number
  liquidDensity: number
  vapourDensity: number
}

/** What a fill limit needs of a fluid: the density of its liquid over temperature, how well it is known, and from where. */
export type LiquidTable = {
  designation: string
  source: string
  /** Last temperature of the table. Units: C. */
  tableMaxC: number
  relativeErrorDensity: number
  /** In rising order of temperature. Units: C, kg/m3. */
  table: readonly { tC: number, liquidDensity: number }[]
  curves: { liquidDensity: Curve }
  /** What makes its figures less sure than their error says. */
  doubt?: string
  /** What an estimated density was multiplied by, to stay under the true one; the table holds the result. */
  derate?: number
}

/**
 * The curves through a table's columns: the liquid's density over the temperature, the logarithms of the
 * vapour's density and of the pressures over its inverse.
 */
export type SaturationCurves = { liquidDensity: Curve, lnVapourDensity: Curve, lnBubblePressure: Curve, lnDewPressure: Curve }

/** What a fluid is made of, by mass. */
export type Composition = {
  designation: string
  components: readonly { component: string, massPercent: number }[]
  source: string
}

/** A refrigerant of the catalogue with what is known of it and how well. */
export type Refrigerant = {
  designation: string
  kind: string
  /** Safety class of ASHRAE 34; null counts as flammable and toxic. */
  safetyClass: string | null
  /** Whether the class was read in a source or is only from memory. */
  safetyClassStatus: string
  safetyClassSource: string
  safetyClassNote?: string
  molarMass: number
  composition: { component: string, massPercent: number }[]
  compositionSource: string | null
  tcK: number
  pcKPa: number
  nbpC: number
  glideK: number
  accuracyGroup: 'A' | 'B' | 'C' | 'D'
  source: string
  accuracy: string
  /** What makes its figures less sure than its accuracy group says. */
  doubt?: string
  /** Last temperature of the table: 0.97 of the critical one, at most 70 C. */
  tableMaxC: number
  relativeErrorPressure: number
  relativeErrorDensity: number
  table: SaturationRow[]
  curves: SaturationCurves
}

/** Pressure against the density of what fills a cylinder, for a fluid that is a gas when warm. Units: C, kg/m3, kPa absolute. */
export type SupercriticalTable = {
  designation: string
  source: string
  tempsC: number[]
  /** Density, then one pressure for each of `tempsC`. */
  rows: number[][]
  /** Pressure over density, one curve for each of `tempsC`. */
  curves: Curve[]
}

/** The same as the data file holds it. */
export type SupercriticalRecord = Omit<SupercriticalTable, 'curves'>

/** A refrigerant as the data file holds it: its table in columns tC, bubble pressure, dew pressure, liquid and vapour density. */
export type RefrigerantRecord = Omit<Refrigerant, 'table' | 'curves'> & { table: number[][] }

/** All refrigerants by designation. */
export type Catalogue = {
  refrigerants: ReadonlyMap<string, Refrigerant>
  supercritical: ReadonlyMap<string, SupercriticalTable>
  /** Blends whose composition is published but whose properties are not held: only their liquid's density can be estimated. */
  compositions: ReadonlyMap<string, Composition>
}
