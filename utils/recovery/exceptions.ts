import { celsiusFromFahrenheit } from '../quantity/temperature'
import type { PressureClass } from '../refrigerant/pressureClass'
import type { Refrigerant } from '../refrigerant/types'
import type { Circumstances, LevelNote } from './types'

const PART_ALONE: LevelNote = {
  text: 'Only the part that is opened needs to be evacuated, where its refrigerant can be isolated in a system receiver; its own full charge then counts. All liquid comes out too, and the level is read before it is opened.',
  source: '40 CFR 82.156(a)',
}

const NOT_MAJOR = 'no compressor, condenser, evaporator or auxiliary coil is taken out, and no opening of more than 4 in² stands open for more than 15 minutes'

const MINOR_REPAIR: LevelNote = {
  text: `A repair that is not major (${NOT_MAJOR}) and is not followed by evacuating to the air needs no more than 0 psig.`,
  source: '40 CFR 82.156(a)(1)(i), (ii); 82.152',
}

const OIL_CHANGE: LevelNote = {
  text: 'An oil change needs no more than 5 psig, in the appliance or in the system receiver that the oil is drained into; where the repair is not major and is not followed by evacuating to the air.',
  source: '40 CFR 82.156(a)(1)(iii)',
}

const LEAKING: LevelNote = {
  text: 'Where leaks keep it from this level, or would foul the refrigerant with air: isolate the leaking parts, bring the sound ones to this level, and the leaking ones as low as they go without fouling, at most 0 psig.',
  source: '40 CFR 82.156(a)(2)',
}

const WARM_BY_HEAT: LevelNote = {
  text: 'Pressurize it by heat as far as that goes; nitrogen may do the rest up to the pressure of the air. Cover openings that cannot be isolated.',
  source: '40 CFR 82.156(a)(1)(ii)',
}

const NO_NITROGEN: LevelNote = {
  text: 'Pressurize it without nitrogen or anything else that must be purged afterwards. Cover openings that cannot be isolated.',
  source: '40 CFR 82.156(a)(1)(ii)',
}

/** Above it a low-pressure refrigerant may be brought up with nitrogen. Source: 40 CFR 82.156(a)(1)(ii). */
const NITROGEN_ABOVE_NBP_C = celsiusFromFahrenheit(85)

const EXEMPT_USES: Readonly<Record<string, string>> = {
  'R-744': 'Carbon dioxide is exempt in every use: no level is asked for. Shown is the row of its class.',
  'R-717': 'Ammonia is exempt in commercial and industrial process refrigeration and in absorption units: no level is asked for there.',
  'R-290': 'Propane is exempt in the small appliances and units that the paragraph lists: no level is asked for there.',
  'R-600a': 'Isobutane is exempt in the small appliances that the paragraph lists: no level is asked for there.',
}

/** What the regulation adds to the table's level, and when it asks for less, the case at hand first. */
export function exceptionsFor(
  { circumstances, pressureClass, refrigerant }: { circumstances: Circumstances, pressureClass: PressureClass, refrigerant: Refrigerant | null },
): LevelNote[] {
  switch (circumstances) {
    case 'major': return [PART_ALONE, MINOR_REPAIR, OIL_CHANGE, LEAKING]
    case 'minor-repair': return [MINOR_REPAIR, ...pressurizing(pressureClass, refrigerant)]
    case 'oil-change': return [OIL_CHANGE]
    case 'leaking': return [LEAKING, PART_ALONE]
  }
}

/** Uses of a refrigerant that the whole subpart leaves alone. Source: 40 CFR 82.154(a)(1). */
export function exemptUse(refrigerant: Refrigerant | null): LevelNote[] {
  const text = refrigerant && EXEMPT_USES[refrigerant.designation]
  return text ? [{ text, source: '40 CFR 82.154(a)(1)' }] : []
}

function pressurizing(pressureClass: PressureClass, refrigerant: Refrigerant | null): LevelNote[] {
  if (pressureClass !== 'low') return []
  return [refrigerant !== null && refrigerant.nbpC > NITROGEN_ABOVE_NBP_C ? WARM_BY_HEAT : NO_NITROGEN]
}
