import { formatDay, wallClock } from '../quantity/instant'
import type { PhotoSubject } from './subject'

/** What a photo is of, as it is chosen. */
export const SUBJECT_WORDS: Record<PhotoSubject, string> = { stamp: 'Stamp', damage: 'Damage', scale: 'Scale', other: 'Something else' }

const OF: Record<PhotoSubject, string> = { stamp: 'Photo of the stamp', damage: 'Photo of the damage', scale: 'Photo of the scale', other: 'Photo' }

/** What to do with a picture of HEIF or AVIF. Source: where phones have the setting, from memory. */
export const HEIC_ADVICE = 'This picture is HEIC or AVIF. Set the camera to save JPEG (on many phones in the settings, under Camera and Formats) and take it again, or send it as JPEG.'

/**
 * A photo in words, for who does not see it.
 *
 * Example: 'Photo of the stamp, 14 May 2026, by Tina'
 */
export function photoWords(photo: { subject: PhotoSubject, takenAt: string | null, arrivedAt: string, by: { name: string } }, timeZone: string): string {
  const ms = Date.parse(photo.takenAt ?? photo.arrivedAt)
  return `${OF[photo.subject]}, ${formatDay(ms, timeZone)} ${wallClock(ms, timeZone).year}, by ${photo.by.name}`
}
