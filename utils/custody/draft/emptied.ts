import { parseFigure } from '../../quantity/figure'
import type { MassReading } from '../../quantity/mass'
import type { DetailsOf } from '../schema'
import type { DraftKind } from './draft'

export interface EmptiedDraft { grossAfter: MassReading | null, gauge: 'microns' | 'inHg', level: string, barometer: string }

/** The form of a cylinder that was emptied; without the vacuum that was reached, a heel is left in it. */
export const EMPTIED: DraftKind<'emptied', EmptiedDraft> = {
  empty: () => ({ grossAfter: null, gauge: 'microns', level: '', barometer: '' }),
  read: ({ grossAfter, gauge, level, barometer }) => {
    const read = readVacuum(gauge, level, barometer)
    if ('reason' in read) return read
    const { vacuum } = read
    if (!vacuum && !grossAfter) return { reason: 'Give the vacuum that was reached, or what the scale shows.' }
    return { details: { ...(grossAfter && { grossAfter }), ...(vacuum && { vacuum }) } }
  },
  of: ({ grossAfter, vacuum }) => {
    const barometer = vacuum && 'inHg' in vacuum ? vacuum.barometerInHg : undefined
    return {
      grossAfter: grossAfter ?? null,
      gauge: vacuum && 'inHg' in vacuum ? 'inHg' : 'microns',
      level: vacuum === undefined ? '' : String('inHg' in vacuum ? vacuum.inHg : vacuum.microns),
      barometer: barometer === undefined ? '' : String(barometer),
    }
  },
}

function readVacuum(
  gauge: EmptiedDraft['gauge'], level: string, barometer: string,
): { vacuum: DetailsOf<'emptied'>['vacuum'] } | { reason: string } {
  const reached = parseFigure(level)
  if ('error' in reached) {
    return reached.error === 'empty' ? { vacuum: undefined } : { reason: 'The vacuum is not a figure. Write it without a comma, such as 450 or 29.1.' }
  }
  if (gauge === 'microns') return { vacuum: { microns: reached.value } }
  const air = parseFigure(barometer)
  if ('error' in air && air.error !== 'empty') return { reason: 'The barometer is not a figure. Write it such as 29.92.' }
  return { vacuum: { inHg: reached.value, ...('value' in air && { barometerInHg: air.value }) } }
}
