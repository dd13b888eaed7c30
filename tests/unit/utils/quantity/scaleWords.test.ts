import { expect, it } from 'vitest'
import { accuracyWords } from '../../../../utils/quantity/scaleWords'

it('says how far a scale may be off by whichever parts it has', () => {
  expect(accuracyWords({ unit: 'oz', value: 0.5 }, 0.5)).toBe('the larger of 0.5\u00A0oz and 0.5\u00A0% of the reading')
  expect(accuracyWords({ unit: 'g', value: 5 }, 0)).toBe('5\u00A0g')
  expect(accuracyWords({ unit: 'lb', value: 0 }, 0.25)).toBe('0.25\u00A0% of the reading')
})
