import { celsiusFromThermometer, kPaFromGauge } from '../../../utils/quantity/gauge'
import { HOUR } from './calendar'
import { daysAgo, fill, made } from './incidents'
import type { Stage } from './lives'

/** What was looked into after it was recovered: by a gauge, by an identifier in the hand, by a laboratory. */
export function playChecks(stage: Stage): void {
  const { cast, script } = stage
  const { second, warehouse } = cast.people
  const byPressure = (psig: number, f: number) => ({
    method: 'pressure' as const, pressureKPa: kPaFromGauge(psig, 'psi'), temperatureC: celsiusFromThermometer(f, 'psi'),
  })

  const sound = made(stage, 4).steel
  const soundAt = fill(stage, sound, { refrigerant: 'R-410A', pounds: 12, days: 19 })
  script.add(second, soundAt + 20 * HOUR, sound.id, 'checked', byPressure(237.2, 80))

  const airy = made(stage, 4).steel
  const airyAt = fill(stage, airy, { refrigerant: 'R-22', pounds: 15, days: 18 })
  script.add(second, airyAt + 20 * HOUR, airy.id, 'checked', byPressure(161.4, 78))

  const doubtful = made(stage, 4, 'small').steel
  const doubtfulAt = fill(stage, doubtful, { refrigerant: null, pounds: 8, days: 29, more: { condition: 'unknown' } })
  script.add(warehouse, doubtfulAt + 26 * HOUR, doubtful.id, 'checked', {
    method: 'identifier', composition: [{ component: 'R-134a', massPercent: 99.2 }, { component: 'air', massPercent: 0.8 }],
    verdict: { refrigerant: 'R-134a', condition: 'suspect' },
  })

  const topped = made(stage, 5).steel
  fill(stage, topped, { refrigerant: 'R-22', pounds: 13, days: 61 })
  script.add(warehouse, daysAgo(stage, 47), topped.id, 'checked', {
    method: 'laboratory', composition: [{ component: 'R-22', massPercent: 87.4 }, { component: 'R-134a', massPercent: 12.1 }],
    verdict: { refrigerant: null, condition: 'mixed' },
  })
}
