import { describe, expect, it } from 'vitest'
import { CYLINDER, DAY, did, FOLD_CONTEXT, idOf, kg, recorded, registered, filled, STAMP, START, VAN, VIEW_CONTEXT } from '~~/tests/helpers/custody'
import type { AnyCustodyEvent, CustodyEvent } from '~~/utils/custody/event'
import { fold } from '~~/utils/custody/fold'
import { preview } from '~~/utils/custody/preview'

const draft = (refrigerant: string, grossAfterKg: number): CustodyEvent<'filled'> => ({
  id: idOf(50), cylinderId: CYLINDER, kind: 'filled', occurredAt: new Date(START + DAY).toISOString(), deviceId: 'phone-1', deviceSeq: 9,
  details: { refrigerant, grossAfter: kg(grossAfterKg), looked: true },
})

describe('a draft', () => {
  const events = recorded(registered(), filled('R-22', 20))

  it('is judged as it would be once recorded', () => {
    const { view, findings } = preview(events, draft('R-22', 29), VIEW_CONTEXT)
    expect(findings.map(({ code }) => code)).toEqual(['overfill'])
    expect(view).toMatchObject({ version: 3, contents: { netGrams: 17_000 }, capacity: { roomGrams: -1000 } })
  })

  it('names each finding once, and none that stood before', () => {
    expect(preview(events, draft('R-22', 27), VIEW_CONTEXT).findings.map(({ code }) => code)).toEqual(['nearly-full'])
    const nearly = recorded(registered(), filled('R-22', 27))
    expect(preview(nearly, draft('R-22', 27.5), VIEW_CONTEXT).findings).toEqual([])
    expect(preview(events, draft('R-134a', 22), VIEW_CONTEXT).findings.map(({ code }) => code)).toEqual(['second-refrigerant'])
  })

  it('tells of a date that has passed, for a fill is a stop whatever is in it', () => {
    const overdue = recorded(registered({ stamp: { ...STAMP, madeMonth: '2019-03' } }), filled('R-22', 20))
    expect(preview(overdue, draft('R-22', 22), VIEW_CONTEXT).findings).toMatchObject([{ code: 'retest-overdue', severity: 'stop' }])
  })

  it('changes nothing of the log', () => {
    const before = JSON.stringify(fold(events, FOLD_CONTEXT))
    preview(events, draft('R-22', 29), VIEW_CONTEXT)
    expect(JSON.stringify(fold(events, FOLD_CONTEXT))).toBe(before)
    expect(events).toHaveLength(2)
  })

  it('says which lines in the log a late event or a correction would change', () => {
    const told = recorded(registered({ gross: kg(12) }), filled('R-22', 20), did('moved', { toPlaceId: VAN }))
    const mend = { ...draft('R-22', 20), kind: 'corrected', details: { eventId: told[1]!.id, reason: 'misread', instead: { refrigerant: 'R-22', grossAfter: kg(19), looked: true } } }
    expect(preview(told, mend as AnyCustodyEvent, VIEW_CONTEXT).changes.map(({ version, before, now }) => [version, before.netGrams, now.netGrams])).toEqual([[2, 8_000, 7_000], [3, 8_000, 7_000]])
    expect(preview(told, draft('R-22', 21), VIEW_CONTEXT).changes).toEqual([])
  })

  it('is judged from the state alone as from the events that made it', () => {
    const { state } = fold(events, FOLD_CONTEXT)
    for (const each of [draft('R-22', 29), draft('R-22', 27), draft('R-134a', 22)]) {
      const [byState, byEvents] = [preview(state, each, VIEW_CONTEXT), preview(events, each, VIEW_CONTEXT)]
      expect(byState.findings).toEqual(byEvents.findings)
      expect(byState.view).toEqual(byEvents.view)
    }
  })

  it('is left to the server from the state alone where it takes the whole log to know', () => {
    const { state } = fold(events, FOLD_CONTEXT)
    const mend = { id: idOf(50), cylinderId: CYLINDER, kind: 'corrected', occurredAt: new Date(START + DAY).toISOString(), deviceId: 'phone-1', deviceSeq: 9, details: { eventId: idOf(1), reason: 'a slip' } }
    expect(preview(state, mend as AnyCustodyEvent, VIEW_CONTEXT)).toMatchObject({ findings: [], changes: [], view: { version: 2 } })
  })
})
