import { queryText, withoutEmpty } from '../address/queryText'
import { massText, parseMassText, readingGrams, type MassReading } from '../quantity/mass'
import { isMachineDate, machineMadeBy } from './machineMade'
import { reachedDraft, reachedQuery, type ReachedDraft } from './reachedDraft'
import { APPLIANCES, CIRCUMSTANCES, MACHINE_MADE, type Appliance, type Circumstances, type MachineMade } from './types'

/** What a person says of the appliance and the machine; '' where it is not known. */
export interface LevelDraft {
  refrigerant: string
  charge: MassReading | null
  machineMade: MachineMade | ''
  appliance: Appliance
  circumstances: Circumstances | ''
  compressorRuns: 'true' | 'false' | ''
  reached: ReachedDraft
}

type Query = Record<string, string>

/** The draft that an address holds. What it does not hold, or holds wrongly, is not known. */
export function levelDraft(query: Record<string, unknown>): LevelDraft {
  const text = (key: string) => queryText(query, key)
  return {
    refrigerant: text('refrigerant'),
    charge: parseMassText(text('charge')),
    machineMade: oneOf(MACHINE_MADE, text('machineMade')) ?? yearMade(text('machineMade')),
    appliance: oneOf(APPLIANCES, text('appliance')) ?? 'other',
    circumstances: oneOf(CIRCUMSTANCES, text('circumstances')) ?? '',
    compressorRuns: oneOf(['true', 'false'] as const, text('compressorRuns')) ?? '',
    reached: reachedDraft(query),
  }
}

/** What the server is asked; the other half of the address is {@link addressOf}. */
export function levelQuery({ refrigerant, charge, machineMade, appliance, circumstances, compressorRuns }: LevelDraft): Query {
  return withoutEmpty({
    refrigerant,
    charge: charge === null ? '' : massText(charge),
    machineMade: appliance === 'mvac' ? '' : machineMade,
    appliance: appliance === 'other' ? '' : appliance,
    circumstances: appliance === 'other' ? circumstances : '',
    compressorRuns: appliance === 'small' ? compressorRuns : '',
  })
}

/** The whole address of a draft: what the server is asked, and what was reached. */
export function addressOf(draft: LevelDraft): Query {
  return { ...levelQuery(draft), ...reachedQuery(draft.reached) }
}

/** The full charge as it was said, in grams. */
export function chargeGramsOf({ charge }: LevelDraft): number | null {
  return charge === null ? null : readingGrams(charge)
}

function yearMade(text: string): MachineMade | '' {
  return isMachineDate(text) ? machineMadeBy(text) ?? '' : ''
}

function oneOf<T extends string>(known: readonly T[], text: string): T | null {
  return known.find(one => one === text) ?? null
}
