import { describe, expect, it } from 'vitest'
import { isFull, rowVerdict } from '../../../../utils/fleet/rowVerdict'
import { cylinderRow } from '../../../helpers/cylinderRow'

describe('the word that the fleet says of a cylinder', () => {
  it('is that it may be used where nothing speaks against it', () => {
    expect(rowVerdict(cylinderRow())).toEqual({ kind: 'ok', text: 'Usable' })
    expect(rowVerdict(cylinderRow({ nothingInIt: true, netGrams: null }))).toEqual({ kind: 'ok', text: 'Empty, usable' })
  })

  it('is a stop where it was used after it was retired, and no more than retired otherwise', () => {
    const used = cylinderRow({ lifecycle: 'retired', worstFinding: { code: 'after-end', severity: 'stop' }, findingCodes: ['after-end'] })
    expect(rowVerdict(used)).toEqual({ kind: 'stop', text: 'Used after its end' })
    expect(rowVerdict(cylinderRow({ lifecycle: 'retired' }))).toEqual({ kind: 'away', text: 'Retired' })
  })

  it('is the stop, before any caution', () => {
    const row = cylinderRow({ worstFinding: { code: 'overfill', severity: 'stop' }, findingCodes: ['overfill', 'retest-soon'] })
    expect(rowVerdict(row)).toEqual({ kind: 'stop', text: 'Overfilled' })
  })

  it('is that something unknown is in it, never that it is usable', () => {
    expect(rowVerdict(cylinderRow({ refrigerant: null }))).toEqual({ kind: 'unk', text: 'Unknown, no limit' })
    expect(rowVerdict(cylinderRow({ refrigerant: null, condition: 'mixed' }))).toEqual({ kind: 'unk', text: 'Mixed, no limit' })
    expect(rowVerdict(cylinderRow({ netGrams: null }))).toEqual({ kind: 'unk', text: 'Not weighed' })
    expect(rowVerdict(cylinderRow({ waterCapacityGrams: null }))).toEqual({ kind: 'unk', text: 'Stamp unknown, no limit' })
  })

  it('is never that it is usable where a limit is known and no stop weight can be given', () => {
    const barred = { stopWeightGrams: null, exactStopWeightGrams: null, roomGrams: null }
    expect(rowVerdict(cylinderRow(barred))).toEqual({ kind: 'unk', text: 'No stop weight' })
    expect(rowVerdict(cylinderRow({ ...barred, findingCodes: ['retest-soon'] })).text).toBe('No stop weight')
    expect(rowVerdict(cylinderRow({ ...barred, findingCodes: ['retest-overdue'] })).text).toBe('Retest overdue')
    expect(rowVerdict(cylinderRow({ findingCodes: ['retest-soon'] }))).toEqual({ kind: 'att', text: 'Usable, retest soon' })
  })

  it('counts a net of nothing as a weight', () => {
    expect(rowVerdict(cylinderRow({ netGrams: 0 })).text).toBe('Usable')
  })

  it('says for how long nobody has seen it, and asks whether it is missing, whatever paper was written since', () => {
    const unseen = (days: number, isLong: boolean) => rowVerdict(cylinderRow({ lastEventKind: 'labelled', unseen: { days, isLong }, findingCodes: ['not-seen'] })).text
    expect(unseen(45, false)).toBe('Not seen for 45 days')
    expect(unseen(60, true)).toBe('Missing? 60 days')
  })

  it('says where a cylinder is that is away, and the stop that stands on it', () => {
    expect(rowVerdict(cylinderRow({ lifecycle: 'at-test' }))).toEqual({ kind: 'away', text: 'At test' })
    const late = cylinderRow({ lifecycle: 'at-test', worstFinding: { code: 'retest-overdue', severity: 'stop' }, findingCodes: ['retest-overdue'] })
    expect(rowVerdict(late)).toEqual({ kind: 'stop', text: 'At test, retest overdue' })
  })

  it('shows a late retest before a near one and a full cylinder as full', () => {
    expect(rowVerdict(cylinderRow({ findingCodes: ['nearly-full', 'retest-overdue'] })).text).toBe('Retest overdue')
    expect(rowVerdict(cylinderRow({ findingCodes: ['retest-soon', 'nearly-full'], netGrams: 16_500, roomGrams: 772 })).text).toBe('Nearly full')
    expect(rowVerdict(cylinderRow({ findingCodes: ['nearly-full'], netGrams: 17_200, roomGrams: 72 })).text).toBe('Full')
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
