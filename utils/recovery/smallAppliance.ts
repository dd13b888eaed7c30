import { SMALL_APPLIANCE_VACUUM } from './evacuationTable'
import { exemptUse } from './exceptions'
import type { AccountLine, EvacuationInput, RequiredLevel } from './types'
import { formatCharge, levelWords, MACHINE_MADE_WORDS } from './words'

const PERCENT_OF_OLD_MACHINE = 80
const PERCENT_WITH_COMPRESSOR = 90
const PERCENT_WITHOUT_COMPRESSOR = 80

/**
 * What must come out of a small appliance: a share of its charge, or four inches of vacuum instead.
 *
 * Source: 40 CFR 82.156(b).
 */
export function smallAppliance({ refrigerant, chargeGrams, machineMade, compressorRuns }: EvacuationInput): RequiredLevel {
  const isOld = machineMade === 'before-1993-11-15'
  const percent = isOld ? PERCENT_OF_OLD_MACHINE : compressorRuns === false ? PERCENT_WITHOUT_COMPRESSOR : PERCENT_WITH_COMPRESSOR
  // A dead compressor asks for the same of either machine.
  const machineMatters = machineMade === null && compressorRuns !== false
  const compressorMatters = compressorRuns === null && !isOld
  const account: AccountLine[] = [
    { term: 'Appliance', value: 'small', note: 'made, charged and sealed in a factory, 5 lb or less (40 CFR 82.152)', isAssumed: false },
    { term: 'Full charge', value: formatCharge(chargeGrams), note: null, isAssumed: false },
    {
      term: 'Recovery machine', value: machineMade ? `made ${MACHINE_MADE_WORDS[machineMade]}` : 'date not known',
      note: machineMade ? null : machineMatters ? 'taken as 15 Nov 1993 or later' : 'makes no difference here', isAssumed: machineMatters,
    },
    {
      term: 'Its compressor', value: compressorRuns === null ? 'not known' : compressorRuns ? 'runs' : 'does not run',
      note: isOld ? 'makes no difference with this machine' : compressorMatters ? 'taken as running' : null, isAssumed: compressorMatters,
    },
    { term: 'In place of a share', value: levelWords(SMALL_APPLIANCE_VACUUM), note: 'does as well', isAssumed: false },
  ]
  return {
    level: { unit: 'percent-of-charge', value: percent },
    alternative: SMALL_APPLIANCE_VACUUM,
    leakingParts: null,
    pressureClass: null,
    account,
    assumed: [
      ...(machineMatters ? ['The machine’s date is not known: taken as 15 Nov 1993 or later, which asks for more.'] : []),
      ...(compressorMatters ? ['Whether the compressor runs is not known: taken as running, which asks for more.'] : []),
    ],
    exceptions: exemptUse(refrigerant),
    source: '40 CFR 82.156(b)',
  }
}
