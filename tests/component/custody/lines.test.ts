import { describe, expect, it } from 'vitest'
import { lineVerb, lineWords } from '~~/components/custody/lines'
import type { LogLine } from '~~/utils/custody/cylinderView'

const checked = (details: object) => ({ kind: 'checked', details, names: {}, place: null }) as unknown as LogLine
const said = (details: object) => lineWords(checked(details)).what.replaceAll('\u00A0', ' ')

describe('a check in the custody log', () => {
  it('reads as it was done: the gauge and the thermometer on both scales, and the barometer where one was read', () => {
    expect(lineVerb(checked({ method: 'pressure' }))).toBe('Checked')
    const reading = { method: 'pressure', pressureKPa: 1091.412, temperatureC: 26.667 }
    expect(said(reading)).toBe('pressure 143.6 psig at 80.0 °F (9.90 bar at 26.7 °C)')
    expect(said({ ...reading, barometerKPa: 84.321 })).toBe('pressure 143.6 psig at 80.0 °F (9.90 bar at 26.7 °C), barometer 24.9 inHg (84.3 kPa)')
  })

  it('says what an analysis found, and that it named none', () => {
    const composition = [{ component: 'R-22', massPercent: 87.4 }, { component: 'air', massPercent: 0 }]
    expect(said({ method: 'identifier', composition, verdict: { refrigerant: 'R-22', condition: 'suspect' } })).toBe('by identifier: R-22, suspect; R-22 87.4 %, air 0 %')
    expect(said({ method: 'laboratory', verdict: { refrigerant: null, condition: 'mixed' } })).toBe('by laboratory: refrigerant not named, mixed')
  })
})
