import { tareInForceGrams } from '~~/utils/capacity/stopWeight'
import type { FillPolicy, Stamp } from '~~/utils/capacity/types'
import type { FillLimitAnswer, FillLimitQuery } from '~~/utils/contract/refrigerants'
import { capacityInWords, capacityOf } from '~~/utils/custody/capacityOf'
import { initialState, type CylinderState } from '~~/utils/custody/state'
import { exactGrams, readingGrams, type MassReading } from '~~/utils/quantity/mass'
import { scaleAccuracyGrams } from '~~/utils/quantity/scale'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { asListed } from '~~/utils/refrigerant/designation'
import { idealMixture } from '~~/utils/refrigerant/idealMixture'
import type { Catalogue, Composition } from '~~/utils/refrigerant/types'
import { mixtureName } from '~~/utils/refrigerant/words'
import type { Requalification } from '~~/utils/requalification/requalification'
import { impossible } from '../http/impossible'

/**
 * The capacity of a stamp for a refrigerant, by the firm's rule of today.
 *
 * Rounding: limits, room and stop weight down.
 * Errors: 422 for a refrigerant that is not known, for a composition without a density, for both or neither of them, and
 * for two service pressures that differ.
 */
export function fillLimitAnswer(query: FillLimitQuery, firmPolicy: FillPolicy): FillLimitAnswer {
  const { refrigerant, catalogue } = fluidOf(query)
  const netGrams = netOf(query.gross, query.tareWeight)
  const policyNow = { ...firmPolicy, shareThousandths: stricterShare(firmPolicy.shareThousandths, query.share) }
  const state = stateOf(query, refrigerant, netGrams)
  const capacity = capacityOf(state, NO_RETEST, { policyNow, catalogue, askedRefrigerant: refrigerant })
  return { ...capacityInWords(capacity, state.stamp), netGrams }
}

const NAMES = [...CATALOGUE.refrigerants.keys(), ...CATALOGUE.compositions.keys()]

/** The fluid asked about, and the catalogue that knows it: a composition is added to it under the name that the trade would write. */
function fluidOf({ refrigerant, composition }: FillLimitQuery): { refrigerant: string, catalogue: Catalogue } {
  if (refrigerant !== undefined) {
    if (composition !== undefined) throw impossible('composition', 'cannot stand beside a refrigerant')
    const listed = asListed(refrigerant, NAMES)
    if (!NAMES.includes(listed)) throw impossible('refrigerant', 'is not in the catalogue')
    return { refrigerant: listed, catalogue: CATALOGUE }
  }
  if (composition === undefined) throw impossible('refrigerant', 'must be named, or a composition')
  const components = composition.map(({ component, massPercent }) => ({ component: asListed(component, CATALOGUE.refrigerants.keys()), massPercent }))
  const designation = mixtureName(components)
  const asked: Composition = { designation, components, source: 'as asked' }
  const mixture = idealMixture(asked, CATALOGUE)
  if ('because' in mixture) throw impossible('composition', mixture.because)
  return { refrigerant: designation, catalogue: { ...CATALOGUE, compositions: new Map([...CATALOGUE.compositions, [designation, asked]]) } }
}

/** A stamp alone says nothing of tests. */
const NO_RETEST: Requalification = { lastMonth: null, intervalMonths: null, dueMonth: null, state: 'not-required', basis: '', choice: null }

/** The cylinder that would have this stamp and this weight. */
function stateOf(query: FillLimitQuery, refrigerant: string, netGrams: number | null): CylinderState {
  const stamp = stampOf(query)
  const exactTareGrams = tareInForceGrams(stamp)
  const unknown = initialState('')
  return {
    ...unknown,
    stamp,
    tare: exactTareGrams === null ? null : { exactGrams: exactTareGrams, since: 0, isWeighedAnew: false },
    contents: {
      ...unknown.contents,
      refrigerant,
      condition: query.condition,
      burnt: query.condition === 'burnt',
      nothingInIt: netGrams === null,
      netGrams,
      lastKnownNetGrams: query.gross && exactTareGrams !== null ? Math.max(0, exactGrams(query.gross) - exactTareGrams) : netGrams,
    },
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
