import { describe, expect, it } from 'vitest'
import type { CylinderView, LogLine } from '../../../../../utils/custody/cylinderView'
import { lastGross, lastGrossByNet } from '../../../../../utils/custody/draft/lastGross'
import { readingGrams, type MassReading } from '../../../../../utils/quantity/mass'

/** TW 27.5 lb is 12,474 g. */
const view = (netGrams: number | null, basis = 'weighed') => ({ contents: { netGrams, basis }, stamp: { tareWeightGrams: 12_474 } }) as CylinderView
const line = (details: object, more: object = {}) => ({ details, ...more }) as LogLine

describe('the last gross of a cylinder', () => {
  const FORTY: MassReading = { unit: 'lb', value: 40 }

  it('is the newest reading that still tells what is in it, as it was entered', () => {
    // 40 lb is 18,144 g: 5,670 g above the tare.
    expect(lastGross(view(5_670), [line({ note: 'moved' }), line({ gross: { unit: 'lb', value: 41 } }), line({ grossAfter: FORTY })])).toEqual(FORTY)
    expect(lastGross(view(5_670), [line({ gross: FORTY }, { correction: {} })])).toBeNull()
  })

  it('is none where the net was not weighed', () => {
    expect([lastGross(view(null), [line({ gross: FORTY })]), lastGross(view(5_670, 'reckoned'), [line({ gross: FORTY })])]).toEqual([null, null])
    expect([lastGrossByNet(view(null), 'lb'), lastGrossByNet(view(5_670, 'reckoned'), 'lb')]).toEqual([null, null])
  })

  it('is without the log the reading of a scale that gives the same grams', () => {
    expect(lastGrossByNet(view(5_670), 'lb')).toEqual(FORTY)
    // 40 lb 3 oz is 18,229 g, which no scale in tenths of a pound shows.
    expect(lastGrossByNet(view(18_229 - 12_474), 'lb')).toEqual({ unit: 'lb-oz', lb: 40, oz: 3 })
  })

  it('is without the log no further off than a gram, whatever the scale', () => {
    for (const grams of [18_000, 18_001, 18_007, 18_013, 20_003]) {
      expect(Math.abs(readingGrams(lastGrossByNet(view(grams - 12_474), 'lb')!) - grams)).toBeLessThanOrEqual(1)
    }
  })
})
