import { buildCatalogue } from './catalogue'
import { COMPOSITIONS } from './data/compositions'
import refrigerants from './data/refrigerants.json'
import supercritical from './data/supercritical.json'
import type { Catalogue, RefrigerantRecord, SupercriticalRecord } from './types'

/**
 * Every refrigerant of the catalogue.
 *
 * Source: saturation data computed with CoolProp 8.0.1dev (Bell, Wronski, Quoilin, Lemort, Ind. Eng. Chem. Res. 53 (2014)
 * 2498, doi 10.1021/ie4033999); each record names its equation of state, its accuracy and where its class was read.
 */
export const CATALOGUE: Catalogue = buildCatalogue(
  refrigerants as unknown as RefrigerantRecord[],
  supercritical as unknown as SupercriticalRecord[],
  COMPOSITIONS,
)
