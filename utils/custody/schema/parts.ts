import { z } from 'zod'
import { normaliseLabelCode } from '../../label/code'
import { RIN } from '../../requalification/struckMark'
import { splitSpec } from '../../requalification/specs'
import { readingGrams } from '../../quantity/mass'
import { isMonth } from '../../quantity/month'

// Far above any scale a cylinder is put on, so that a slip of the finger does not become a record.
const MOST_POUNDS = 100_000
const MOST_KILOGRAMS = 45_000
const MOST_PSIG = 10_000

// Half of a surrogate pair is no character: a database keeps another in its place, and the chain would not close.
const CONTROL_CHARACTERS = /[\p{Cc}\p{Cs}\u202A-\u202E\u2066-\u2069]/u
const CONTROL_CHARACTERS_BUT_LINE_ENDS = /[\p{Cs}\u202A-\u202E\u2066-\u2069]|(?![\n\r\t])\p{Cc}/u
const REFRIGERANT = /^R[A-Z]{0,2}-\d{1,4}[A-Za-z0-9]*(?:\([EZ]\))?$/

/** A UUID, in lower case. */
export const uuid = z.uuid('must be an id (a UUID)').transform(value => value.toLowerCase())

/** The name a device gives itself; a script has none. */
export const deviceName = z.string('must be a text').max(100, 'must be at most 100 characters')
  .refine(text => !CONTROL_CHARACTERS.test(text), 'must not hold control characters')

/** A line that a person typed, without line breaks or control characters. */
export function line(longest: number) {
  return z.string('must be a text').trim().min(1, 'must not be empty').max(longest, `must be at most ${longest} characters`)
    .refine(text => !CONTROL_CHARACTERS.test(text), 'must not hold control characters')
}

/** A few sentences that a person typed. */
export function prose(longest: number) {
  return z.string('must be a text').trim().min(1, 'must not be empty').max(longest, `must be at most ${longest} characters`)
    .refine(text => !CONTROL_CHARACTERS_BUT_LINE_ENDS.test(text), 'must not hold control characters')
}

function figure(most: number, unit: string) {
  return z.number('must be a number').nonnegative('must not be negative').max(most, `must be at most ${most} ${unit}`)
}

/** A mass as it was read off a scale or a stamp, kept as entered. */
export const mass = z.discriminatedUnion('unit', [
  z.strictObject({ unit: z.literal('lb'), value: figure(MOST_POUNDS, 'lb') }),
  z.strictObject({
    unit: z.literal('lb-oz'),
    lb: figure(MOST_POUNDS, 'lb').int('must be whole pounds'),
    oz: z.number('must be a number').nonnegative('must not be negative').lt(16, 'must be less than 16 oz'),
  }),
  z.strictObject({ unit: z.literal('kg'), value: figure(MOST_KILOGRAMS, 'kg') }),
], 'must be a mass: { "unit": "lb", "value": 41.8 }, { "unit": "lb-oz", "lb": 41, "oz": 13 } or { "unit": "kg", "value": 18.97 }')

/** A stamped mass: a cylinder weighs something and holds something, and not only a trace that rounds to no gram. */
const stampedMass = mass.refine(
  reading => readingGrams(reading) > 0,
  'must be more than nothing; leave it unknown (null) where it cannot be read',
)

/** A calendar month, 'YYYY-MM', of a year in which cylinders were made. */
export const month = z.string('must be a month such as "2027-03"')
  .refine(text => isMonth(text) && text >= '1900-01' && text < '2200-01', 'must be a month such as "2027-03"')

/** A designation of a refrigerant. One that the catalogue does not hold is a fact too: it only has no fill limit. */
export const refrigerant = z.string('must be a refrigerant such as "R-410A"').max(20, 'must be at most 20 characters')
  .regex(REFRIGERANT, 'must be a refrigerant such as "R-410A"')

/** What is known of a refrigerant beside its name. */
export const condition = z.enum(['clean', 'suspect', 'burnt', 'mixed', 'unknown'],
  'must be clean, suspect, burnt, mixed or unknown')

/** A label code with its check character right, in any case and with or without spaces. */
export const labelCode = z.string('must be a label code').max(40, 'must be a label code').transform((text, context) => {
  const code = normaliseLabelCode(text)
  if (code !== null) return code
  context.addIssue({ code: 'custom', message: 'must be a label code: nine characters, the last of which checks the others' })
  return z.NEVER
})

/** A requalifier identification number. */
export const rin = z.string('must be a RIN').regex(RIN, 'must be a RIN: four letters or figures, such as "A123"')

/** What is stamped behind a test date to say how it was done. */
export const suffix = line(3)

/** How a requalification is done. */
export const retestMethod = z.enum(['volumetric', 'proof', 'visual'], 'must be volumetric, proof or visual')

/** A requalification mark, as stamped. */
export const mark = z.strictObject({ month, rin: rin.optional(), suffix: suffix.optional() })

const spec = z.string('must be a specification such as "DOT-4BA"').refine(
  text => text.length <= 20 && splitSpec(text)?.spec === text,
  'must be a specification without its pressure, such as "DOT-4BA"',
)

/** What is stamped on the collar. What cannot be read is null: then there is no number, and the view says what is missing. */
export const stamp = z.strictObject({
  serial: line(40).nullable(),
  serialUnreadable: z.boolean().optional(),
  maker: line(80).optional(),
  spec,
  servicePressurePsig: z.number('must be a pressure in psig').positive('must be above 0 psig')
    .max(MOST_PSIG, `must be at most ${MOST_PSIG} psig`).nullable(),
  tareWeight: stampedMass.nullable(),
  tareIncludesValve: z.boolean().optional(),
  waterCapacity: stampedMass.nullable(),
  madeMonth: month.nullable(),
  flammableMarked: z.boolean('must be true or false'),
  floatSwitch: z.boolean().optional(),
  valve: line(80).optional(),
})

/** A tare that was weighed anew. */
export const newTare = stampedMass

/** A vacuum as the trade reads it: microns absolute, or inches of mercury below the barometer. */
export const vacuum = z.union([
  z.strictObject({ microns: z.number().nonnegative('must not be negative').max(1_000_000, 'must be at most 1,000,000 microns') }),
  z.strictObject({
    inHg: z.number().nonnegative('must not be negative').max(32, 'must be at most 32 inHg'),
    barometerInHg: z.number().min(15, 'must be at least 15 inHg').max(32, 'must be at most 32 inHg').optional(),
  }),
], 'must be { "microns": 500 } or { "inHg": 29.2 }')

const dateTime = z.iso.datetime({ offset: true })

/** An instant: ISO 8601 with its offset, and a time that exists. */
export const instant = z.string('must be a time with its offset, such as "2026-03-02T14:05:00-05:00"').refine(
  text => dateTime.safeParse(withSeconds(text)).success && Number.isFinite(Date.parse(text)),
  'must be a time with its offset, such as "2026-03-02T14:05:00-05:00"',
)

// ISO 8601 lets the seconds be left out; the check wants them.
function withSeconds(text: string): string {
  return text.replace(/^(\d{4}-\d{2}-\d{2}T\d{2}:\d{2})(?=Z|[+-])/, '$1:00')
}
