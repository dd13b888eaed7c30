import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { buildCatalogue } from '~~/utils/refrigerant/catalogue'
import type { Catalogue } from '~~/utils/refrigerant/types'

/** A catalogue of one made-up fluid, under a name of the trade, whose liquid has one density at every temperature. Units: kg/m3. */
export function catalogueOfFluid(designation: string, liquidDensity: number): Catalogue {
  const model = CATALOGUE.refrigerants.get('R-134a')!
  const table = model.table.map(row => [row.tC, row.bubblePressureKPa, row.dewPressureKPa, liquidDensity, row.vapourDensity])
  return buildCatalogue([{ ...model, designation, table }], [])
}
