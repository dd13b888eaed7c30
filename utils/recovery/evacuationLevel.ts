import { pressureClassOf } from '../refrigerant/pressureClass'
import { accountOf } from './account'
import { LARGE_CHARGE_GRAMS, MVAC_VACUUM, SMALL_CHARGE_GRAMS } from './evacuationTable'
import { exceptionsFor, exemptUse } from './exceptions'
import { smallAppliance } from './smallAppliance'
import { tableLevel } from './tableLevel'
import type { Circumstances, EvacuationInput, EvacuationLevel, RequiredLevel } from './types'

/**
 * The level to which an appliance must be evacuated before it is opened or disposed of.
 *
 * What is not known is taken as what asks for more, and said. A refrigerant within the doubt of a class bound is held
 * to the class that asks for more. This is what the appliance must come down to; what a recovery machine must be able
 * to reach at its certification is another table, 40 CFR 82.158 Table 2.
 *
 * Source: 40 CFR 82.156(a) to (d), Table 1.
 */
export function requiredLevel(input: EvacuationInput): RequiredLevel {
  if (input.appliance === 'mvac') return ofVehicle(input)
  const isSmall = input.appliance === 'small' && (input.chargeGrams === null || input.chargeGrams <= SMALL_CHARGE_GRAMS)
  return isSmall ? smallAppliance(input) : byTable(input)
}

const AT_MOST_AIR: EvacuationLevel = { unit: 'psig', value: 0 }
const AT_MOST_5_PSIG: EvacuationLevel = { unit: 'psig', value: 5 }

function byTable(input: EvacuationInput): RequiredLevel {
  const classing = input.refrigerant && pressureClassOf(input.refrigerant)
  const { cell, matters } = tableLevel({
    pressureClasses: classing && [classing.pressureClass, ...(classing.nearBound ? [classing.nearBound.pressureClass] : [])],
    charge: input.chargeGrams === null ? null : input.chargeGrams < LARGE_CHARGE_GRAMS ? 'under-200-lb' : 'from-200-lb',
    machineMade: input.machineMade,
  })
  const circumstances = input.circumstances ?? 'major'
  const level = levelUnder(circumstances, cell.level)
  const account = accountOf({ input, classing, cell, matters, level })
  return {
    level,
    alternative: null,
    leakingParts: circumstances === 'leaking' ? AT_MOST_AIR : null,
    pressureClass: cell.pressureClass,
    ...account,
    exceptions: [...exemptUse(input.refrigerant), ...exceptionsFor({ circumstances, pressureClass: cell.pressureClass, refrigerant: input.refrigerant })],
    source: SOURCES[circumstances],
  }
}

function levelUnder(circumstances: Circumstances, ofTable: EvacuationLevel): EvacuationLevel {
  if (circumstances === 'minor-repair') return AT_MOST_AIR
  return circumstances === 'oil-change' ? AT_MOST_5_PSIG : ofTable
}

const SOURCES: Record<Circumstances, string> = {
  'major': '40 CFR 82.156(a), Table 1',
  'minor-repair': '40 CFR 82.156(a)(1)(i), (ii)',
  'oil-change': '40 CFR 82.156(a)(1)(iii)',
  'leaking': '40 CFR 82.156(a)(2)(ii), Table 1',
}

function ofVehicle({ refrigerant }: EvacuationInput): RequiredLevel {
  return {
    level: MVAC_VACUUM,
    alternative: null,
    leakingParts: null,
    pressureClass: null,
    account: [
      { term: 'Appliance', value: 'air conditioner of a vehicle, or like one', note: 'before it is disposed of', isAssumed: false },
      { term: 'Level', value: '102 mmHg vacuum', note: 'the same for every refrigerant, charge and machine', isAssumed: false },
    ],
    assumed: [],
    exceptions: [
      ...exemptUse(refrigerant),
      { text: 'Recovery by the practice for vehicles (40 CFR 82 subpart B) does as well. Service of a vehicle goes by that subpart alone.', source: '40 CFR 82.156(c), (d)' },
    ],
    source: '40 CFR 82.156(c), (d)',
  }
}
