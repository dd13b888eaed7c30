import { fillLimit } from '~~/utils/capacity/fillLimit'
import { fitFindings } from '~~/utils/capacity/fit'
import { liquidFullTemperature } from '~~/utils/capacity/liquidFull'
import { roomGrams, stopWeight, tareInForceGrams } from '~~/utils/capacity/stopWeight'
import type { FillPolicy, Stamp } from '~~/utils/capacity/types'
import type { FillLimitAnswer, FillLimitQuery } from '~~/utils/contract/refrigerants'
import { readingGrams, type MassReading } from '~~/utils/quantity/mass'
import { scaleAccuracyGrams } from '~~/utils/quantity/scale'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { problem } from '../http/problem'

/**
 * The capacity of a stamp for a refrigerant, by the firm's rule of today.
 *
 * Rounding: limits, room and stop weight down.
 * Errors: 422 for a refrigerant that the catalogue does not have, and for two service pressures that differ.
 */
export function fillLimitAnswer(query: FillLimitQuery, firmPolicy: FillPolicy): FillLimitAnswer {
  const refrigerant = CATALOGUE.refrigerants.get(query.refrigerant)
  if (!refrigerant) throw impossible('refrigerant', 'is not in the catalogue')
  const stamp = stampOf(query)
  const policy = { ...firmPolicy, shareThousandths: stricterShare(firmPolicy.shareThousandths, query.share) }
  const limit = fillLimit({
    stamp, refrigerant: query.refrigerant, condition: query.condition, burnt: query.condition === 'burnt', policy, catalogue: CATALOGUE,
  })
  const refusals = fitFindings({ stamp, refrigerant: query.refrigerant, catalogue: CATALOGUE })
    .filter(finding => finding.severity === 'stop').map(finding => ({ ...finding, since: null }))
  const netGrams = netOf(query.gross, query.tareWeight)

  const exactTareGrams = tareInForceGrams(stamp)
  const mayGiveStop = refusals.length === 0 && limit.missing.length === 0
  const stop = mayGiveStop && limit.exactLimitGrams !== null && exactTareGrams !== null
    ? stopWeight(limit.exactLimitGrams, exactTareGrams)
    : null
  const gramsWhenHot = netGrams ?? limit.fillLimitGrams
  return {
    forRefrigerant: query.refrigerant,
    governingRule: limit.governingRule,
    fillLimitGrams: limit.fillLimitGrams,
    stopWeightGrams: stop?.stopWeightGrams ?? null,
    exactStopWeightGrams: stop?.exactStopWeightGrams ?? null,
    roomGrams: stop && limit.fillLimitGrams !== null && netGrams !== null ? roomGrams(limit.fillLimitGrams, netGrams) : null,
    liquidFull: gramsWhenHot === null || limit.missing.includes('refrigerant')
      ? null
      : liquidFullTemperature({
          netGrams: gramsWhenHot, refrigerant,
          waterCapacityGrams: query.waterCapacity ? readingGrams(query.waterCapacity) : null,
        }),
    share: policy.shareThousandths / 1000,
    terms: limit.terms,
    missing: netGrams === null ? [...limit.missing, 'weight'] : limit.missing,
    refusals,
    netGrams,
  }
}

function stampOf(query: FillLimitQuery): Stamp {
  const { spec, servicePressurePsig: inMark } = query.spec
  const given = query.servicePressurePsig
  if (inMark !== null && given !== undefined && inMark !== given) {
    throw impossible('servicePressurePsig', `differs from the ${inMark} psig in the specification`)
  }
  return {
    serial: null,
    spec,
    servicePressurePsig: inMark ?? given ?? null,
    tareWeight: query.tareWeight ?? null,
    waterCapacity: query.waterCapacity ?? null,
    madeMonth: null,
    flammableMarked: query.flammableMarked === 'true',
  }
}

/** The lower of the firm's share and the one asked for; what lies between two thousandths goes down. */
function stricterShare(firmThousandths: number, share: number | undefined): number {
  const floatNoise = 1e-9
  return share === undefined ? firmThousandths : Math.min(firmThousandths, Math.floor(share * 1000 + floatNoise))
}

/** Net by the scale; below tare 0 within the scale's accuracy, else not known. */
function netOf(gross: MassReading | undefined, tare: MassReading | undefined): number | null {
  if (!gross || !tare) return null
  const net = readingGrams(gross) - readingGrams(tare)
  if (net >= 0) return net
  return -net <= scaleAccuracyGrams(readingGrams(gross)) ? 0 : null
}

function impossible(path: string, message: string) {
  return problem(422, 'This cannot be computed', 'Mend what is named.', [{ path, message }])
}
