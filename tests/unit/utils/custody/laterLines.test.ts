import { describe, expect, it } from 'vitest'
import { corrected, did, filled, FOLD_CONTEXT, HOUR, idOf, kg, recorded, registered, SHOP, START, SUPERVISOR, VAN, weighed, type Told } from '~~/tests/helpers/custody'
import { cameLate, laterLines } from '~~/utils/custody/laterLines'

const at = (hours: number) => ({ occurredAt: START + hours * HOUR, recordedAt: START + 48 * HOUR })

/** What the last event of a story changed in the lines before it. */
function changedBy(...story: Told[]) {
  const events = recorded(...story)
  return (laterLines(events, FOLD_CONTEXT).get(idOf(story.length - 1)) ?? []).map(({ version, before, now }) => [version, before.netGrams, now.netGrams, now.findings])
}

describe('an event that comes late', () => {
  it('changes what the lines after it say, and names them with what they said before', () => {
    // Weighed at 18 kg with nothing known of it; then a fill of the hour before arrives.
    const events = recorded(registered({ gross: kg(12) }), weighed(18), filled('R-22', 17, {}, at(0.5)))
    expect(laterLines(events, FOLD_CONTEXT)).toEqual(new Map([[idOf(2), [{
      eventId: idOf(1), version: 2, kind: 'weighed',
      before: { netGrams: 6_000, refrigerant: null, condition: 'unknown', findings: [] },
      now: { netGrams: 6_000, refrigerant: 'R-22', condition: 'clean', findings: [] },
    }]]]))
  })

  it('changes nothing where a later line says the same by itself', () => {
    expect(changedBy(registered({ gross: kg(12) }), filled('R-22', 18, { grossBefore: kg(12) }), did('moved', { toPlaceId: VAN }, at(0.5)))).toEqual([])
  })

  it('carries through to lines that keep the weight', () => {
    expect(changedBy(registered({ gross: kg(12) }), filled('R-22', 18), did('received', {}, { placeId: SHOP }), weighed(17.5, at(1.5)))).toEqual([[3, 6_000, 5_500, []]])
  })

  it('is late only where something of later effect was recorded before it', () => {
    const events = recorded(registered(), weighed(18), weighed(19, at(0.5)), weighed(20, at(3)))
    expect(events.map(event => cameLate(event, events))).toEqual([false, false, true, false])
  })

  it('is late where it is the registration that the cylinder begins with, though it claims a later time than the rest', () => {
    // 18 kg on the scale says nothing before the tare of 12 kg is known.
    expect(changedBy(weighed(18), registered({ gross: kg(12) }, at(5)))).toEqual([[1, null, 6_000, []]])
    // A second registration of a later time begins nothing.
    const events = recorded(registered(), weighed(18), registered({}, at(5)), registered({}, at(-1)))
    expect(events.map(event => cameLate(event, events))).toEqual([false, false, false, true])
  })

  it('takes no heed of corrections and signatures, which have a time of their own', () => {
    const events = recorded(registered(), filled('R-22', 18), corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(19), looked: true }), weighed(19, at(1.5)))
    expect(cameLate(events[3]!, events)).toBe(false)
    const signed = recorded(registered(), weighed(18, { trainee: true, supervisorId: SUPERVISOR }), did('countersigned', { eventId: idOf(1) }, { actorId: SUPERVISOR }))
    expect(laterLines(signed, FOLD_CONTEXT).get(idOf(2))?.map(({ before, now }) => [before.findings, now.findings])).toEqual([[['unsigned'], []]])
  })
})

describe('a correction', () => {
  it('shows the line it mends and all that rest on it, before and after', () => {
    expect(changedBy(
      registered({ gross: kg(12) }), filled('R-22', 29), did('moved', { toPlaceId: VAN }), corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(20), looked: true }),
    )).toEqual([[2, 17_000, 8_000, []], [3, 17_000, 8_000, []]])
  })

  it('that is itself corrected shows what came back', () => {
    expect(changedBy(registered({ gross: kg(12) }), filled('R-22', 20), corrected(idOf(1)), corrected(idOf(2)))).toEqual([[2, 0, 8_000, []]])
  })
})
