import { expect, it } from 'vitest'
import { statusText } from '../../../../utils/picture/status'

it('sets the text of each status in a colour of its own', () => {
  const classes = (['ok', 'att', 'stop', 'unk', 'away'] as const).map(statusText)
  expect(classes).toEqual(['text-okT', 'text-attT', 'text-stopT', 'text-unkT', 'text-muted'])
})
