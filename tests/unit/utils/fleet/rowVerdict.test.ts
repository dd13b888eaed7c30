import { describe, expect, it } from 'vitest'
import { isFull, rowVerdict } from '../../../../utils/fleet/rowVerdict'
import { cylinderRow } from '../../../helpers/cylinderRow'

const NOW = Date.parse('2026-12-01T12:00:00Z')

describe('the word that the fleet says of a cylinder', () => {
  it('is that it may be used where nothing speaks against it', () => {
    expect(rowVerdict(cylinderRow(), NOW)).toEqual({ kind: 'ok', text: 'Usable' })
    expect(rowVerdict(cylinderRow({ nothingInIt: true, netGrams: null }), NOW)).toEqual({ kind: 'ok', text: 'Empty, usable' })
  })

  it('is the stop, before any caution', () => {
    const row = cylinderRow({ worstFinding: { code: 'overfill', severity: 'stop' }, findingCodes: ['overfill', 'retest-soon'] })
    expect(rowVerdict(row, NOW)).toEqual({ kind: 'stop', text: 'Overfilled' })
  })

  it('is that something unknown is in it, never that it is usable', () => {
    expect(rowVerdict(cylinderRow({ refrigerant: null }), NOW)).toEqual({ kind: 'unk', text: 'Unknown, no limit' })
    expect(rowVerdict(cylinderRow({ refrigerant: null, condition: 'mixed' }), NOW)).toEqual({ kind: 'unk', text: 'Mixed, no limit' })
    expect(rowVerdict(cylinderRow({ netGrams: null }), NOW)).toEqual({ kind: 'unk', text: 'Not weighed' })
    expect(rowVerdict(cylinderRow({ waterCapacityGrams: null }), NOW)).toEqual({ kind: 'unk', text: 'Stamp unknown, no limit' })
  })

  it('is never that it is usable where a limit is known and no stop weight can be given', () => {
    const barred = { stopWeightGrams: null, exactStopWeightGrams: null, roomGrams: null }
    expect(rowVerdict(cylinderRow(barred), NOW)).toEqual({ kind: 'unk', text: 'No stop weight' })
    expect(rowVerdict(cylinderRow({ ...barred, findingCodes: ['retest-soon'] }), NOW).text).toBe('No stop weight')
    expect(rowVerdict(cylinderRow({ ...barred, findingCodes: ['retest-overdue'] }), NOW).text).toBe('Retest overdue')
    expect(rowVerdict(cylinderRow({ findingCodes: ['retest-soon'] }), NOW)).toEqual({ kind: 'att', text: 'Usable, retest soon' })
  })

  it('counts a net of nothing as a weight', () => {
    expect(rowVerdict(cylinderRow({ netGrams: 0 }), NOW).text).toBe('Usable')
  })

  it('asks whether it is missing from the ninetieth day on', () => {
    const unseen = (lastEventAt: string) => rowVerdict(cylinderRow({ lastEventAt, findingCodes: ['not-seen'] }), NOW).text
    expect(unseen('2026-09-03T12:00:00Z')).toBe('Not seen for 89 days')
    expect(unseen('2026-09-02T12:00:00Z')).toBe('Missing? 90 days')
  })

  it('says where a cylinder is that is away, and the stop that stands on it', () => {
    expect(rowVerdict(cylinderRow({ lifecycle: 'at-test' }), NOW)).toEqual({ kind: 'away', text: 'At test' })
    const late = cylinderRow({ lifecycle: 'at-test', worstFinding: { code: 'retest-overdue', severity: 'stop' }, findingCodes: ['retest-overdue'] })
    expect(rowVerdict(late, NOW)).toEqual({ kind: 'stop', text: 'At test, retest overdue' })
  })

  it('shows a late retest before a near one and a full cylinder as full', () => {
    expect(rowVerdict(cylinderRow({ findingCodes: ['nearly-full', 'retest-overdue'] }), NOW).text).toBe('Retest overdue')
    expect(rowVerdict(cylinderRow({ findingCodes: ['retest-soon', 'nearly-full'], netGrams: 16_500, roomGrams: 772 }), NOW).text).toBe('Nearly full')
    expect(rowVerdict(cylinderRow({ findingCodes: ['nearly-full'], netGrams: 17_200, roomGrams: 72 }), NOW).text).toBe('Full')
  })
})

describe('a full cylinder', () => {
  // Half a percent of 12474 + 17124 = 29598 g is 147.99 g, rounded up to 148 g: the scale cannot tell less.
  it('has less room than its scale can tell', () => {
    expect(isFull(cylinderRow({ netGrams: 17_124, roomGrams: 148 }))).toBe(false)
    expect(isFull(cylinderRow({ netGrams: 17_125, roomGrams: 147 }))).toBe(true)
  })

  it('is not one that is overfilled, nor one whose room is not known', () => {
    expect(isFull(cylinderRow({ netGrams: 17_273, roomGrams: -1 }))).toBe(false)
    expect(isFull(cylinderRow({ roomGrams: null, netGrams: null }))).toBe(false)
  })
})
