import { queryText } from '../address/queryText'
import { parseFigure } from '../quantity/figure'
import { exactGrams, massText, parseMassText, type MassReading } from '../quantity/mass'
import type { EvacuationLevel, Reached } from './types'

export const GAUGES = ['inHg', 'mmHgAbsolute', 'microns', 'recovered'] as const
/** What tells whether a level was reached: one of three gauges, or the scale. */
export type Gauge = typeof GAUGES[number]

/** What was read, as typed. */
export interface ReachedDraft {
  /** '' while none is chosen. */
  gauge: Gauge | ''
  figure: string
  barometer: string
  recovered: MassReading | null
  held: string
}

/** What a draft comes to, and what cannot be read of it. */
export interface ReadReached {
  reached: Reached | null
  heldMinutes: number | null
  faults: { figure?: string, barometer?: string, held?: string }
}

/** Bounds of what can be read: far outside of them it was a slip of the finger. Units: as each gauge reads. */
export const MOST_READ = { inHg: 32, mmHgAbsolute: 1_000, microns: 1_000_000, heldMinutes: 10_000 } as const
export const BAROMETER_RANGE = { least: 15, most: 32 } as const

/** What tells whether a level was reached: as chosen, else as that level is usually read. A weight tells only a share. */
export function gaugeFor({ gauge }: ReachedDraft, { unit }: EvacuationLevel): Gauge {
  const isShare = unit === 'percent-of-charge'
  if (gauge !== '' && (gauge !== 'recovered' || isShare)) return gauge
  if (isShare) return 'recovered'
  return unit === 'mmHg-absolute' ? 'mmHgAbsolute' : 'inHg'
}

/** What was read, of what an address holds; of an empty one, nothing. */
export function reachedDraft(query: Record<string, unknown>): ReachedDraft {
  const text = (key: string) => queryText(query, key)
  const gauge = GAUGES.find(one => text(one) !== '') ?? ''
  return {
    gauge,
    figure: gauge === '' || gauge === 'recovered' ? '' : text(gauge),
    barometer: text('barometerInHg'),
    recovered: parseMassText(text('recovered')),
    held: text('heldMinutes'),
  }
}

/** What an address holds of it. */
export function reachedQuery(draft: ReachedDraft): Record<string, string> {
  const { gauge } = draft
  const value = gauge === 'recovered' ? draft.recovered && massText(draft.recovered) : plain(draft.figure)
  return {
    ...(gauge && value ? { [gauge]: value } : {}),
    ...(gauge === 'inHg' && plain(draft.barometer) ? { barometerInHg: plain(draft.barometer)! } : {}),
    ...(plain(draft.held) ? { heldMinutes: plain(draft.held)! } : {}),
  }
}

/** What was read, for a judgement; an empty field is nothing read, never 0. */
export function readReached(draft: ReachedDraft, gauge: Gauge, charge: MassReading | null): ReadReached {
  const held = read(draft.held, MOST_READ.heldMinutes)
  const heldMinutes = held.value ?? null
  const heldFault = held.fault && { held: held.fault }
  if (gauge === 'recovered') {
    const reached = draft.recovered && charge ? { recoveredGrams: exactGrams(draft.recovered), chargeGrams: exactGrams(charge) } : null
    return { reached, heldMinutes, faults: { ...heldFault } }
  }
  const figure = read(draft.figure, MOST_READ[gauge])
  const barometer: ReturnType<typeof read> = gauge === 'inHg' ? read(draft.barometer, BAROMETER_RANGE.most, BAROMETER_RANGE.least) : {}
  const isReadable = figure.value !== undefined && !barometer.fault
  return {
    reached: isReadable ? readingOn(gauge, figure.value!, barometer.value) : null,
    heldMinutes,
    faults: { ...(figure.fault && { figure: figure.fault }), ...(barometer.fault && { barometer: barometer.fault }), ...heldFault },
  }
}

function readingOn(gauge: Exclude<Gauge, 'recovered'>, value: number, barometerInHg: number | undefined): Reached {
  if (gauge === 'microns') return { microns: value }
  return gauge === 'mmHgAbsolute' ? { mmHgAbsolute: value } : { inHg: value, ...(barometerInHg === undefined ? {} : { barometerInHg }) }
}

function read(typed: string, most: number, least = 0): { value?: number, fault?: string } {
  const parsed = parseFigure(typed)
  if ('error' in parsed) return parsed.error === 'empty' ? {} : { fault: 'This is not a figure. Write it without a comma, such as 450 or 28.5.' }
  return parsed.value < least || parsed.value > most ? { fault: `It goes from ${least} to ${most.toLocaleString('en-US')}.` } : { value: parsed.value }
}

function plain(typed: string): string | null {
  const parsed = parseFigure(typed)
  return 'value' in parsed ? String(parsed.value) : null
}
