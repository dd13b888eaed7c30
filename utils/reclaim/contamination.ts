import { applyCorrections } from '../custody/corrections'
import type { AnyRecordedEvent } from '../custody/event'

/** How a refrigerant is named in an analysis; air, moisture and oil are none. */
const REFRIGERANT = /^R-?\d/i

// Keeps 2.0000000000000004 from becoming 2.1.
const FLOAT_NOISE = 1e-6

/**
 * How much of other refrigerants a cylinder holds by its last analysis, in percent by mass; null where nothing was
 * analysed since something was last put in, or where the analysis does not list the refrigerant that it came to.
 *
 * Rounding: up to a tenth, so that what is above a limit never reads as at it. Source: our choice; components that are no refrigerant are not counted.
 */
export function contaminationPercent(events: readonly AnyRecordedEvent[]): number | null {
  let percent: number | null = null
  for (const { event, isOut } of applyCorrections(events)) {
    if (isOut) continue
    if (event.kind === 'filled' || event.kind === 'emptied' || event.kind === 'registered' || (event.kind === 'transferred' && event.details.direction === 'in')) percent = null
    if (event.kind !== 'checked' || event.details.method === 'pressure' || !event.details.composition) continue
    percent = othersIn(event.details.composition, event.details.verdict.refrigerant)
  }
  return percent
}

function othersIn(composition: readonly { component: string, massPercent: number }[], named: string | null): number | null {
  const refrigerants = composition.filter(({ component }) => REFRIGERANT.test(component))
  // Where the analysis could not say what it is, the most of it is taken for what it was.
  const own = refrigerants.find(({ component }) => named !== null && component.toUpperCase() === named.toUpperCase())
    ?? (named === null ? [...refrigerants].sort((a, b) => b.massPercent - a.massPercent)[0] : undefined)
  if (!own) return null
  const others = refrigerants.filter(one => one !== own).reduce((sum, { massPercent }) => sum + massPercent, 0)
  return Math.ceil(others * 10 - FLOAT_NOISE) / 10
}
