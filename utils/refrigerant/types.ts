/** Saturation of a refrigerant at one temperature, as computed from its equation of state. Units: C, kPa absolute, kg/m3. */
export type SaturationRow = {
  tC: number
  bubblePressureKPa: number
  dewPressureKPa: number
  liquidDensity: number
  vapourDensity: number
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
  /** Last temperature of the table: 0.97 of the critical one, at most 70 C. */
  tableMaxC: number
  relativeErrorPressure: number
  relativeErrorDensity: number
  table: SaturationRow[]
}

/** Pressure against the density of what fills a cylinder, for a fluid that is a gas when warm. Units: C, kg/m3, kPa absolute. */
export type SupercriticalTable = {
  designation: string
  source: string
  tempsC: number[]
  /** Density, then one pressure for each of `tempsC`. */
  rows: number[][]
}

/** A refrigerant as the data file holds it: its table in columns tC, bubble pressure, dew pressure, liquid and vapour density. */
export type RefrigerantRecord = Omit<Refrigerant, 'table'> & { table: number[][] }

/** All refrigerants by designation. */
export type Catalogue = {
  refrigerants: ReadonlyMap<string, Refrigerant>
  supercritical: ReadonlyMap<string, SupercriticalTable>
}
