import { describe, expect, it } from 'vitest'
import { mayBeWithdrawn, standings, type DatedRow } from '~~/utils/reclaim/dated'

function row(id: string, fromDay: string, more: Partial<DatedRow> = {}): DatedRow {
  return { id, fromDay, recordedAt: 0, isWithdrawn: false, ...more }
}

const said = (rows: DatedRow[], today: string) => Object.fromEntries(standings(rows, today))

describe('what was recorded from a day on', () => {
  const rows = [row('march', '2026-03-01'), row('june', '2026-06-01'), row('august', '2026-08-01')]

  it('counts from its first day until the day before the next begins', () => {
    expect(said(rows, '2026-05-31')).toEqual({ march: { is: 'in-force' }, june: { is: 'to-come' }, august: { is: 'to-come' } })
    expect(said(rows, '2026-06-01')).toEqual({ march: { is: 'ended', untilDay: '2026-05-31' }, june: { is: 'in-force' }, august: { is: 'to-come' } })
  })

  it('never counts once another took its place from the same day', () => {
    const mended = [row('slip', '2026-06-01', { recordedAt: 1 }), row('mended', '2026-06-01', { recordedAt: 2 })]
    expect(said(mended, '2026-06-01')).toEqual({ slip: { is: 'replaced' }, mended: { is: 'in-force' } })
  })

  it('leaves what stood before it in force once it is withdrawn', () => {
    expect(said([row('march', '2026-03-01'), row('june', '2026-06-01', { isWithdrawn: true })], '2026-07-01'))
      .toEqual({ march: { is: 'in-force' }, june: { is: 'withdrawn' } })
  })
})

describe('what was recorded may be taken back', () => {
  it('before it begins', () => {
    expect(mayBeWithdrawn({ fromDay: '2026-06-02', isWithdrawn: false }, '2026-05-01', '2026-06-01')).toBe(true)
    expect(mayBeWithdrawn({ fromDay: '2026-06-01', isWithdrawn: false }, '2026-05-01', '2026-06-01')).toBe(false)
  })

  it('on the day it was recorded, for a slip of the pen, and once only', () => {
    expect(mayBeWithdrawn({ fromDay: '2026-03-01', isWithdrawn: false }, '2026-06-01', '2026-06-01')).toBe(true)
    expect(mayBeWithdrawn({ fromDay: '2026-03-01', isWithdrawn: true }, '2026-06-01', '2026-06-01')).toBe(false)
  })
})
