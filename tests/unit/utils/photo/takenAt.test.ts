import { expect, it } from 'vitest'
import { takenAtOf } from '~~/utils/photo/takenAt'

const ARRIVED = Date.parse('2026-12-01T12:00:00Z')

it.each([
  ['2026-12-01T05:00:00-06:00', Date.parse('2026-12-01T11:00:00Z')],
  ['2000-01-01T00:00:00Z', 946_684_800_000],
  ['1999-12-31T23:59:59Z', null],
  ['0000-01-01T00:00:00Z', null],
  // A day ahead of the server's clock, and a second more.
  ['2026-12-02T12:00:00Z', ARRIVED + 86_400_000],
  ['2026-12-02T12:00:01Z', null],
  [undefined, null],
])('a photo that says it was taken at %s is kept with %s', (claimed, expected) => {
  expect(takenAtOf(claimed, ARRIVED)).toBe(expected)
})
