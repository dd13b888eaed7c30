import { describe, expect, it } from 'vitest'
import { CHECKED, type CheckedDraft } from '~~/utils/custody/draft/checked'
import type { DraftContext } from '~~/utils/custody/draft/draft'
import { NOT_KNOWN } from '~~/utils/custody/draft/filled'
import { DETAILS } from '~~/utils/custody/schema'

const inPounds = { unit: 'lb' } as DraftContext
const inKilograms = { unit: 'kg' } as DraftContext

const byPressure = (more: Partial<CheckedDraft['pressure']>, context = inPounds) => {
  const draft = CHECKED.empty(context)
  return CHECKED.read({ ...draft, pressure: { ...draft.pressure, ...more } }, context)
}
const byAnalysis = (more: Partial<CheckedDraft['analysis']>) => {
  const draft = CHECKED.empty(inPounds)
  return CHECKED.read({ ...draft, method: 'laboratory', analysis: { ...draft.analysis, refrigerant: 'R-22', condition: 'clean', ...more } }, inPounds)
}

describe('the form of a check by pressure', () => {
  it('reads psig and °F of who weighs in pounds, bar and °C of who weighs in kilograms', () => {
    // 143.6 x 6.894757 + 101.325; (80 - 32) / 1.8.
    expect(byPressure({ pressure: '143.6', temperature: '80' })).toEqual({ details: { method: 'pressure', pressureKPa: 1091.412, temperatureC: 26.667 } })
    expect(byPressure({ pressure: '9,9', temperature: '26,7' }, inKilograms)).toEqual({ details: { method: 'pressure', pressureKPa: 1091.325, temperatureC: 26.7 } })
  })

  it('takes a vacuum and a frost with their minus', () => {
    expect(byPressure({ pressure: '-4.9', temperature: '−4' })).toEqual({ details: { method: 'pressure', pressureKPa: 67.541, temperatureC: -20 } })
  })

  it('keeps what is said of the instruments and of the air, and makes none of it up', () => {
    expect(byPressure({ pressure: '100', temperature: '80', gaugeError: '0.5', thermometerError: '1', barometer: '24.9' })).toEqual({
      details: { method: 'pressure', pressureKPa: 790.801, temperatureC: 26.667, gaugeErrorKPa: 3.447, thermometerErrorC: 0.556, barometerKPa: 84.321 },
    })
  })

  it('says what is missing or cannot be', () => {
    expect(byPressure({ temperature: '80' })).toEqual({ reason: 'Type what the gauge shows.' })
    expect(byPressure({ pressure: '100' })).toEqual({ reason: 'Type what the thermometer shows.' })
    expect(byPressure({ pressure: 'high', temperature: '80' })).toHaveProperty('reason')
    expect(byPressure({ pressure: '100', temperature: '80', barometer: '1013' })).toEqual({ reason: 'The barometer shows more or less than can be. Look at its unit.' })
    // 14.696 psi is all the air there is.
    expect(byPressure({ pressure: '-14.6', temperature: '80' })).toHaveProperty('details')
    expect(byPressure({ pressure: '-14.8', temperature: '80' })).toHaveProperty('reason')
    expect(byPressure({ pressure: '-13', temperature: '80', barometer: '24.9' })).toEqual({ reason: 'The gauge shows a deeper vacuum than the air allows.' })
  })
})

describe('the form of an analysis', () => {
  it('gives its parts and its verdict; an empty line is none', () => {
    expect(byAnalysis({ parts: [{ component: ' R-22 ', percent: '98,5' }, { component: 'air', percent: '0' }, { component: '', percent: '' }] })).toEqual({
      details: { method: 'laboratory', composition: [{ component: 'R-22', massPercent: 98.5 }, { component: 'air', massPercent: 0 }], verdict: { refrigerant: 'R-22', condition: 'clean' } },
    })
    expect(byAnalysis({})).toEqual({ details: { method: 'laboratory', verdict: { refrigerant: 'R-22', condition: 'clean' } } })
    expect(byAnalysis({ refrigerant: NOT_KNOWN, condition: 'mixed' })).toEqual({ details: { method: 'laboratory', verdict: { refrigerant: null, condition: 'mixed' } } })
  })

  it('says what is missing or cannot be', () => {
    expect(byAnalysis({ refrigerant: '' })).toEqual({ reason: 'Choose what it was found to be.' })
    expect(byAnalysis({ condition: '' })).toEqual({ reason: 'Choose the condition it was found in.' })
    expect(byAnalysis({ refrigerant: NOT_KNOWN })).toEqual({ reason: 'What cannot be named is not clean. Choose another condition.' })
    expect(byAnalysis({ parts: [{ component: 'R-22', percent: '' }] })).toEqual({ reason: 'Give R-22 as a percentage, such as 98.5.' })
    expect(byAnalysis({ parts: [{ component: '', percent: '3' }] })).toEqual({ reason: 'Name each part that has a percentage.' })
    expect(byAnalysis({ parts: [{ component: 'R-134a', percent: '60' }, { component: 'r-134A', percent: '3' }] })).toEqual({ reason: 'r-134A stands there twice.' })
    const both = (percent: string) => byAnalysis({ parts: [{ component: 'R-22', percent: '60' }, { component: 'R-12', percent }] })
    expect(both('41')).toHaveProperty('details')
    expect(both('41.1')).toEqual({ reason: 'The parts come to more than 100 %.' })
  })
})

describe('a recorded check in its form', () => {
  it.each([
    { method: 'pressure', pressureKPa: 1091.412, temperatureC: 26.667 },
    { method: 'pressure', pressureKPa: 67.541, temperatureC: -20, gaugeErrorKPa: 3.447, thermometerErrorC: 0.556, barometerKPa: 84.321 },
    { method: 'identifier', verdict: { refrigerant: null, condition: 'mixed' }, composition: [{ component: 'R-22', massPercent: 60 }, { component: 'R-12', massPercent: 40 }] },
    { method: 'laboratory', verdict: { refrigerant: 'R-410A', condition: 'burnt' } },
  ])('comes out of it as it went in: $method', (recorded) => {
    const details = DETAILS.checked.parse(recorded)
    expect(CHECKED.read(CHECKED.of(details, null, 'lb'), inPounds)).toEqual({ details })
  })

  it('shows the gauge as it was read', () => {
    const details = DETAILS.checked.parse({ method: 'pressure', pressureKPa: 1091.412, temperatureC: 26.667 })
    expect(CHECKED.of(details, null, 'lb').pressure).toMatchObject({ gauge: 'psi', pressure: '143.6', temperature: '80' })
  })
})
