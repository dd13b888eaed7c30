import { describe, expect, it } from 'vitest'
import { photoWords } from '../../../../utils/photo/words'

describe('a photo in words', () => {
  const photo = { subject: 'stamp' as const, takenAt: '2026-05-15T03:30:00.000Z', arrivedAt: '2026-05-17T10:00:00.000Z', by: { name: 'Tina' } }

  it('says what it is of, the day on which it was taken where the firm is, and by whom', () => {
    expect(photoWords(photo, 'America/Chicago')).toBe('Photo of the stamp, 14 May 2026, by Tina')
  })

  it('goes by its arrival where nobody knows when it was taken', () => {
    expect(photoWords({ ...photo, subject: 'other', takenAt: null }, 'America/Chicago')).toBe('Photo, 17 May 2026, by Tina')
  })
})
