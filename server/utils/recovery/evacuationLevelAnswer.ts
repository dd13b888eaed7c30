import type { EvacuationLevelAnswer, EvacuationLevelQuery } from '~~/utils/contract/recovery'
import { exactGrams, readingGrams } from '~~/utils/quantity/mass'
import { requiredLevel } from '~~/utils/recovery/evacuationLevel'
import { judgeLevel } from '~~/utils/recovery/judgeLevel'
import type { Reached } from '~~/utils/recovery/types'
import { onGauges } from '~~/utils/recovery/words'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { asListed } from '~~/utils/refrigerant/designation'
import type { Refrigerant } from '~~/utils/refrigerant/types'
import { impossible } from '../http/impossible'

/**
 * The level that an appliance must be evacuated to, and whether it was reached.
 *
 * Errors: 422 for a refrigerant that the catalogue does not have, for two gauges at once, for a barometer without the
 * gauge it belongs to, and for what was recovered without a charge.
 */
export function evacuationLevelAnswer(query: EvacuationLevelQuery): EvacuationLevelAnswer {
  const refrigerant = refrigerantOf(query.refrigerant)
  const required = requiredLevel({
    refrigerant,
    chargeGrams: query.charge ? readingGrams(query.charge) : null,
    machineMade: query.machineMade ?? null,
    appliance: query.appliance,
    circumstances: query.circumstances ?? null,
    compressorRuns: query.compressorRuns === undefined ? null : query.compressorRuns === 'true',
  })
  const reached = reachedOf(query)
  return {
    refrigerant: refrigerant?.designation ?? null,
    ...required,
    onGauges: onGauges(required.level, query.barometerInHg),
    judged: reached || query.heldMinutes !== undefined ? judgeLevel(required, reached, query.heldMinutes ?? null) : null,
  }
}

function refrigerantOf(designation: string | undefined): Refrigerant | null {
  if (designation === undefined) return null
  const found = CATALOGUE.refrigerants.get(asListed(designation, CATALOGUE.refrigerants.keys()))
  if (!found) throw impossible('refrigerant', 'is not in the catalogue; leave it out where it is not known')
  return found
}

function reachedOf({ inHg, barometerInHg, microns, mmHgAbsolute, recovered, charge }: EvacuationLevelQuery): Reached | null {
  const given = Object.entries({ inHg, microns, mmHgAbsolute, recovered }).filter(([, value]) => value !== undefined).map(([name]) => name)
  if (given.length > 1) throw impossible(given[1]!, `stands beside ${given[0]}; say what was reached in one way`)
  if (barometerInHg !== undefined && inHg === undefined) throw impossible('barometerInHg', 'belongs to a gauge that reads inHg; give inHg too')
  if (inHg !== undefined) return { inHg, ...(barometerInHg === undefined ? {} : { barometerInHg }) }
  if (microns !== undefined) return { microns }
  if (mmHgAbsolute !== undefined) return { mmHgAbsolute }
  if (recovered === undefined) return null
  if (!charge || exactGrams(charge) === 0) throw impossible('charge', 'must be known and more than nothing: what was recovered is a share of it')
  return { recoveredGrams: exactGrams(recovered), chargeGrams: exactGrams(charge) }
}
