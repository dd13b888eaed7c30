import { describe, expect, it } from 'vitest'
import { parseEvent } from '~~/utils/custody/schema/parseEvent'
import { CYLINDER, idOf } from '~~/tests/helpers/custody'

/** What is wrong with the details of a check, as 'path: message'; nothing where they are sound. */
function faults(details: unknown): string[] {
  const parsed = parseEvent({ id: idOf(1), cylinderId: CYLINDER, kind: 'checked', occurredAt: '2026-07-01T12:00:00-05:00', details })
  return parsed.ok ? [] : parsed.errors.map(({ path, message }) => `${path}: ${message}`)
}

const byPressure = { method: 'pressure', pressureKPa: 1091.4, temperatureC: 26.7 }
const verdict = { refrigerant: 'R-22', condition: 'clean' }

describe('a check of the contents as sent', () => {
  it('is by pressure, identifier or laboratory', () => {
    expect(faults(byPressure)).toEqual([])
    expect(faults({ ...byPressure, barometerKPa: 84.3, gaugeErrorKPa: 7, thermometerErrorC: 1 })).toEqual([])
    expect(faults({ method: 'identifier', verdict })).toEqual([])
    expect(faults({ method: 'laboratory', verdict: { refrigerant: null, condition: 'mixed' }, composition: [{ component: 'R-22', massPercent: 60 }, { component: 'air', massPercent: 0 }] })).toEqual([])
    expect(faults({ method: 'smell' })).toEqual(['details.method: must have a method: pressure, identifier or laboratory'])
    expect(faults({})).toEqual(['details.method: is missing'])
  })

  it('by pressure has both readings and gives no verdict', () => {
    expect(faults({ method: 'pressure' })).toEqual(['details.pressureKPa: is missing', 'details.temperatureC: is missing'])
    expect(faults({ ...byPressure, verdict })).toEqual(['details.verdict: is not a field that can be given here'])
    expect(faults({ ...byPressure, composition: [{ component: 'R-22', massPercent: 100 }] })).toEqual(['details.composition: is not a field that can be given here'])
    expect(faults({ ...byPressure, pressureKPa: '1091' })).toEqual(['details.pressureKPa: must be a number'])
  })

  it('shows nothing that a gauge, a thermometer or a barometer cannot', () => {
    expect(faults({ ...byPressure, pressureKPa: 0 })).toEqual([])
    expect(faults({ ...byPressure, pressureKPa: -0.1 })).toContain('details.pressureKPa: must be at least 0 kPa')
    expect(faults({ ...byPressure, temperatureC: 200.1 })).toEqual(['details.temperatureC: must be at most 200 degrees Celsius'])
    expect(faults({ ...byPressure, gaugeErrorKPa: -1 })).toEqual(['details.gaugeErrorKPa: must be at least 0 kPa'])
    // 29.92 sent for 101.325: inches of mercury.
    expect(faults({ ...byPressure, barometerKPa: 29.92 })).toEqual(['details.barometerKPa: must be at least 50 kPa'])
    // The gauge shows 101.325 - 17.1 = 84.2 kPa below the air: all there is of 84.3, more than there is of 84.2.
    expect(faults({ ...byPressure, pressureKPa: 17.1, barometerKPa: 84.3 })).toEqual([])
    expect(faults({ ...byPressure, pressureKPa: 17.1, barometerKPa: 84.2 })).toEqual(['details.pressureKPa: is a deeper vacuum than this barometer allows'])
  })

  it('by an instrument or a laboratory has a verdict, and no reading of a gauge', () => {
    expect(faults({ method: 'identifier' })).toEqual(['details.verdict: is missing'])
    expect(faults({ method: 'laboratory', verdict: { refrigerant: 'R-22' } })).toEqual(['details.verdict.condition: is missing'])
    expect(faults({ method: 'laboratory', verdict: { condition: 'clean' } })).toEqual(['details.verdict.refrigerant: is missing'])
    expect(faults({ method: 'identifier', verdict, pressureKPa: 500 })).toEqual(['details.pressureKPa: is not a field that can be given here'])
  })

  it('does not call clean what it cannot name', () => {
    expect(faults({ method: 'identifier', verdict: { refrigerant: null, condition: 'clean' } })).toEqual(['details.verdict: cannot call clean what nobody can name'])
    expect(faults({ method: 'identifier', verdict: { refrigerant: null, condition: 'suspect' } })).toEqual([])
  })

  it('has each part once, and parts that come to no more than a hundred but for rounding', () => {
    const parts = (...percents: number[]) => faults({ method: 'laboratory', verdict, composition: percents.map((massPercent, index) => ({ component: `R-${index}`, massPercent })) })
    expect(parts(50.5, 50.5)).toEqual([])
    expect(parts(50.5, 50.6)).toEqual(['details.composition: must not come to more than 100 %'])
    expect(parts(-1)).toEqual(['details.composition.0.massPercent: must not be negative'])
    expect(parts()).toEqual(['details.composition: must name a component'])
    const twice = [{ component: 'R-22', massPercent: 1 }, { component: 'R-22', massPercent: 2 }]
    expect(faults({ method: 'laboratory', verdict, composition: twice })).toEqual(['details.composition: must name each component once'])
    const inTwoCases = [{ component: 'R-134a', massPercent: 1 }, { component: 'r-134A', massPercent: 2 }]
    expect(faults({ method: 'identifier', verdict, composition: inTwoCases })).toEqual(['details.composition: must name each component once'])
  })
})
