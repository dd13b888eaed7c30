import { STANDARD_ATMOSPHERE_KPA } from '../../quantity/pressure'
import { pressureCheck, whyNoCheck } from '../../refrigerant/pressureCheck'
import { fullReading } from '../../refrigerant/pressureReading'
import { gasExcess, pressureInNothing } from '../findings/pressure'
import type { DetailsOf } from '../schema'
import { loseNet } from './contents'
import { rename } from './ledger'
import type { Turn } from './turn'
import { raiseAway } from './whereabouts'

/** What is in it is checked: a pressure only speaks for or against what the log has, an analysis sets it. */
export function checked(turn: Turn<'checked'>): void {
  const { details } = turn.event
  // A laboratory has the sample, wherever the cylinder is meanwhile.
  if (details.method !== 'laboratory') raiseAway(turn)
  if (details.method === 'pressure') judgePressure(turn, details)
  else setTo(turn, details.verdict)
}

function judgePressure(turn: Turn, details: Extract<DetailsOf<'checked'>, { method: 'pressure' }>): void {
  const { refrigerant: name, nothingInIt } = turn.state.contents
  const reading = fullReading(details)
  if (nothingInIt) {
    const gaugeKPa = reading.pressureKPa - STANDARD_ATMOSPHERE_KPA
    if (gaugeKPa > reading.gaugeErrorKPa) turn.findings.push(pressureInNothing(gaugeKPa))
    return
  }
  const refrigerant = name === null ? undefined : turn.context.catalogue.refrigerants.get(name)
  if (refrigerant === undefined || whyNoCheck(refrigerant, details.temperatureC) !== null) return
  const { verdict, excessKPa } = pressureCheck({ ...reading, refrigerant })
  if (verdict === 'excess') turn.findings.push(gasExcess(refrigerant.designation, excessKPa))
}

/**
 * The contents are what the analysis says, better or worse than the log had them.
 *
 * What the steel remembers stays until a deep vacuum: that it was burnt, and every refrigerant that the log once put in.
 * Where nothing was in it by the log, something is, and how much is not known.
 */
function setTo(turn: Turn, verdict: Extract<DetailsOf<'checked'>, { verdict: unknown }>['verdict']): void {
  const { contents } = turn.state
  if (contents.nothingInIt) loseNet(turn, 'weighing')
  rename(turn, verdict.refrigerant)
  contents.condition = verdict.condition
  contents.burnt ||= verdict.condition === 'burnt'
  contents.nothingInIt = false
  contents.evacuated = false
  contents.backFromReclaim = false
  if (verdict.refrigerant !== null) {
    contents.knownSinceVacuum = [...contents.knownSinceVacuum.filter(name => name !== verdict.refrigerant), verdict.refrigerant]
  }
}
