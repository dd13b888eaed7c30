import { exactGrams, formatMass, type MassReading, type MassUnit } from '../quantity/mass'
import type { StatusKind } from '../picture/status'
import type { RecoveryPlan } from './plan'
import type { FillStage } from './stage'

/** The status in which each stage is shown and sounded. */
export const STAGE_STATUS: Record<FillStage, StatusKind> = { below: 'ok', near: 'att', stop: 'stop', past: 'stop' }

/**
 * How far it is to the stop, in two lines.
 *
 * Rounding: what may still go in down, an excess up.
 *
 * @example { head: '3.7 lb to go, about 6 min', line: 'Past 90 % of 38.1 lb, limit by water weight' }
 */
export function wayWords(plan: RecoveryPlan, gross: MassReading, stage: FillStage, minutes: number | null, unit: MassUnit): { head: string, line: string } {
  const toGo = plan.stopGrams - exactGrams(gross)
  const limit = `${formatMass(plan.limitGrams, unit, 'down')}, limit by ${plan.rule}`
  if (stage === 'past') {
    return {
      head: `${formatMass(-toGo, unit, 'up')} past the stop`,
      line: 'It is overfilled. Keep it cool, do not move it by road, and have a trained person draw it down.',
    }
  }
  if (stage === 'stop') return { head: 'Stop: it is at its stop weight', line: `It holds ${limit}.` }
  const head = `${formatMass(toGo, unit, 'down')} to go${minutesWords(minutes)}`
  return { head, line: stage === 'near' ? `Past 90 % of ${limit}` : `Of ${limit}` }
}

function minutesWords(minutes: number | null): string {
  if (minutes === null) return ''
  return minutes === 0 ? ', less than a minute: read the scale' : `, about ${minutes} min`
}

/** What is to be done at the stop, as it is called out. */
export function stopCall(stage: FillStage): string {
  return stage === 'past' ? 'Stop. Past the stop weight: shut the valve now.' : 'Stop. Shut the valve now.'
}
