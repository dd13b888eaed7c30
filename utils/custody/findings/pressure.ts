import { formatDifference } from '../../quantity/gauge'
import type { Finding } from '../finding'
import { OWN_RULE } from './words'

/** The pressure is above what the refrigerant alone can have. What is in it beside that, no pressure tells. */
export function gasExcess(refrigerant: string, excessKPa: number): Finding {
  const excess = `${formatDifference(excessKPa, 'psi')} (${formatDifference(excessKPa, 'kPa')})`
  return {
    code: 'gas-excess', severity: 'caution', source: 'US Army TM 5-3810-307-24-1-2', since: null,
    text: `Its pressure is ${excess} above what ${refrigerant} has at this temperature. Air or another gas may be in it; a pressure cannot tell which. `
      + 'Let it stand in the shade and check again; bleed vapor only into recovery equipment. If it stays above, it goes to a reclaimer.',
  }
}

/** It stands under pressure although the log has nothing in it. Units: kPa above the air around it. */
export function pressureInNothing(gaugeKPa: number): Finding {
  return {
    code: 'gas-excess', severity: 'caution', source: OWN_RULE, since: null,
    text: `By the log nothing is in it, yet it stands ${formatDifference(gaugeKPa, 'psi')} (${formatDifference(gaugeKPa, 'kPa')}) above the air. `
      + 'Something is in it; a pressure cannot tell what. Weigh it, and have it analyzed or evacuate it into recovery equipment before anything goes in.',
  }
}
