import type { EnteredReading } from './pressureEntry'
import { PRESSURE_READING_RANGES, type PressureReading, type PressureReadingField } from './pressureReading'

const FIELDS = Object.keys(PRESSURE_READING_RANGES) as PressureReadingField[]

/** A reading as the query of an address, by the names of the API. */
export function pressureQuery(reading: EnteredReading): Record<string, string> {
  return Object.fromEntries(FIELDS.flatMap(name => reading[name] === undefined ? [] : [[name, String(reading[name])]]))
}

/** What of a reading stands in an address. What is no figure is left out; one that cannot be stays, for its field to say so. */
export function readingInQuery(query: Record<string, unknown>): Partial<PressureReading> {
  return Object.fromEntries(FIELDS.flatMap((name) => {
    const text = query[name]
    const value = typeof text === 'string' && text.trim() !== '' ? Number(text) : Number.NaN
    return Number.isFinite(value) ? [[name, value]] : []
  }))
}
