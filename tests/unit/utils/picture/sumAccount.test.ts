import { describe, expect, it } from 'vitest'
import type { LogLine } from '~~/utils/custody/cylinderView'
import { sumAccount } from '~~/utils/picture/sumAccount'
import { sumSources, type SumSources } from '~~/utils/picture/sumSources'
import { did, filled, HOUR, kg, REQUALIFIER, recorded, registered, START, viewAfter, type Told } from '../../../helpers/custody'

const CLOCK = { nowMs: START + 5 * HOUR, timeZone: 'America/Chicago' }
const NO_SOURCES: SumSources = { weighing: null, stampRead: null, newTare: null }

/** The lines of a story as the log gives them, newest first. */
function linesOf(story: Told[], corrections: Record<number, LogLine['correction']> = {}): LogLine[] {
  return recorded(...story).map((event, index) => ({
    id: event.id, kind: event.kind, details: event.details, author: { id: event.actorId, name: 'T. Averly' },
    occurredAt: new Date(event.occurredAt).toISOString(), effectiveAt: new Date(event.effectiveAt).toISOString(),
    correction: corrections[index] ?? null,
  } as LogLine)).reverse()
}

/** The sum of a story with its own log, as 'words figure'. */
function sumOf(story: Told[]) {
  const view = viewAfter(story)
  return sumAccount(view, sumSources(linesOf(story), view.contents), 'kg', CLOCK)
}

function figures(lines: ReturnType<typeof sumOf>) {
  return lines.map(({ words, figure, reason }) => `${words} ${figure ? figure.figure : `– ${reason}`}`)
}

describe('the sum behind a stop weight', () => {
  it('goes from the scale to the stop weight', () => {
    const lines = sumOf([registered(), filled('R-22', 20)])
    expect(figures(lines)).toEqual(['Scale reads 20.00', 'less tare weight \u221212.00', 'Net 8.00', 'Fill limit 16.00', 'Room 8.00', 'Stop weight 28.00'])
    expect(lines[0]!.note).toBe('today 13:00 by T. Averly, hoses off')
    expect(lines[1]!.note).toBe('stamp')
    expect(lines[3]!.note).toBe('water weight, 0.80 × WC, of R-22')
  })

  it('of an empty cylinder waits for the refrigerant', () => {
    const lines = sumOf([registered()])
    expect(figures(lines).slice(2)).toEqual(['Net 0.00', 'Fill limit – by refrigerant', 'Room – not known', 'Stop weight – not known'])
  })

  it('of contents that nobody can name does not ask for a refrigerant', () => {
    const lines = sumOf([registered({ contents: 'unknown', gross: { unit: 'kg', value: 15 } })])
    expect(figures(lines)).toContain('Fill limit – not known')
  })

  it('gives no room above a limit but keeps it negative, and says what it says of a refusal', () => {
    const over = sumOf([registered(), filled('R-22', 28.5)])
    expect(figures(over)).toContain('Room \u22120.50')
    const refused = sumOf([registered({ stamp: { ...viewAfter([registered()]).stamp!, spec: 'DOT-39' } }), filled('R-22', 20)])
    expect(figures(refused).slice(4)).toEqual(['Room – not usable', 'Stop weight – nothing may go in'])
  })

  it('says that a reckoned net was not read from a scale', () => {
    const view = viewAfter([registered(), filled('R-22', 20)])
    const reckoned = { ...view, contents: { ...view.contents, basis: 'reckoned' as const } }
    expect(sumAccount(reckoned, NO_SOURCES, 'kg', CLOCK)[0]).toMatchObject({ figure: null, reason: 'the net was reckoned, not weighed' })
  })
})

describe('where the figures of a sum were read', () => {
  const story = [registered(), filled('R-22', 20), did('weighed', { gross: kg(21) })]

  it('finds the last reading up to the net\'s own instant, and the registration', () => {
    const { weighing, stampRead, newTare } = sumSources(linesOf(story), { basis: 'weighed', asOf: new Date(START + HOUR).toISOString() })
    expect(weighing).toEqual({ atMs: START + HOUR, by: 'T. Averly', gross: kg(20) })
    expect(stampRead).toEqual({ atMs: START, by: 'T. Averly' })
    expect(newTare).toBeNull()
  })

  it('has no reading of a net that was reckoned', () => {
    expect(sumSources(linesOf(story), { basis: 'reckoned', asOf: new Date(START + 2 * HOUR).toISOString() }).weighing).toBeNull()
  })

  it('passes over what a correction took out, and takes what it put in its place', () => {
    const corrected = [...story, did('corrected', { eventId: 'the third', reason: 'misread', instead: { gross: kg(19) } })]
    const correcting = linesOf(corrected)[0]!.id
    const asOf = { basis: 'weighed' as const, asOf: new Date(START + 3 * HOUR).toISOString() }
    expect(sumSources(linesOf(corrected, { 2: { eventId: correcting, reason: 'misread', takenOut: false } }), asOf).weighing?.gross).toEqual(kg(19))
    expect(sumSources(linesOf(corrected, { 2: { eventId: correcting, reason: 'misread', takenOut: true } }), asOf).weighing?.gross).toEqual(kg(20))
  })

  it('names the retest that set a new tare', () => {
    const retested = [registered(), did('retested', { month: '2026-07', method: 'volumetric', result: 'passed', requalifierId: REQUALIFIER, newTare: kg(11.9) })]
    const lines = sumOf(retested)
    expect(lines[1]).toMatchObject({ note: 'new tare at a retest, today 13:00 by T. Averly', figure: { figure: '\u221211.90' } })
  })
})
