import { z } from 'zod'
import { unprintable } from '../label/printable'
import { parseMassText, readingGrams } from '../quantity/mass'

/** A UUID in lower case. */
export const id = z.uuid('must be an id (a UUID)').transform(value => value.toLowerCase())

/** The path of a thing by its id. */
export const idParams = z.strictObject({ id })

// Some characters are there and show nothing: spaces of no width, marks of direction, the empty letter of Hangul, blank braille.
const VISIBLE = /[^\p{Z}\p{C}\p{Default_Ignorable_Code_Point}\u2800]/u

/** A line of text that a person typed: trimmed, with something to be seen in it, without control characters. */
export function line(longest: number) {
  return z.string().trim().min(1, 'must not be empty').max(longest, `must be at most ${longest} characters`)
    .regex(/^[^\p{Cc}\p{Cs}\u202A-\u202E\u2066-\u2069]*$/u, 'must not hold control characters')
    .refine(text => text === '' || VISIBLE.test(text), 'must hold a character that can be seen')
}

/** A line that stands on labels and papers too, as a name does. */
export function printedLine(longest: number) {
  return line(longest).superRefine((text, context) => {
    const not = unprintable(text)
    if (not.length > 0) context.addIssue({ code: 'custom', message: `cannot be printed with ${not.slice(0, 5).join(' ')}: labels take Latin, Greek and Cyrillic letters` })
  })
}

/** A page of a list: how many, and where the page before ended. */
export const page = {
  limit: z.coerce.number().int().min(1).max(200).default(50),
  cursor: z.string().max(400).optional(),
}

/** A list's answer. */
export interface Page<T> { items: T[], nextCursor: string | null, total?: number }

/** A mass as it was read; the same form as in an event. */
export const massReading = z.discriminatedUnion('unit', [
  z.strictObject({ unit: z.literal('lb'), value: z.number().nonnegative().finite().max(100_000) }),
  z.strictObject({ unit: z.literal('lb-oz'), lb: z.number().int().nonnegative().max(100_000), oz: z.number().nonnegative().lt(16) }),
  z.strictObject({ unit: z.literal('kg'), value: z.number().nonnegative().finite().max(50_000) }),
])

/** What a scale shows with a cylinder on it. */
export const grossReading = massReading.refine(reading => readingGrams(reading) > 0, 'must be more than nothing')

/** A mass as it is written in a query; no more than in an event. */
export const massInQuery = z.string().max(20).transform((text, context) => {
  const reading = parseMassText(text)
  if (reading && massReading.safeParse(reading).success) return reading
  context.addIssue({ code: 'custom', message: reading ? 'must be at most 100,000 lb or 50,000 kg' : 'must be a mass such as 47.6lb, 41lb13oz or 18.97kg' })
  return z.NEVER
})

/** A stamped mass as it is written in a query: a cylinder weighs something and holds something. */
export const stampedMassInQuery = massInQuery.refine(reading => readingGrams(reading) > 0, 'must be more than nothing; leave it out where it cannot be read')

/** Whether no id stands twice in a list. */
export function eachOnce(ids: readonly string[]): boolean {
  return new Set(ids).size === ids.length
}
