import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { corrected, did, filled, FOLD_CONTEXT, HOUR, idOf, kg, OTHER_CYLINDER, recorded, registered, SHOP, START, SUPERVISOR, SUPPLIER, weighed, type Told } from '~~/tests/helpers/custody'
import { anyStory } from '~~/tests/helpers/custodyArbitraries'
import { continueFold } from '~~/utils/custody/continueFold'
import { fold } from '~~/utils/custody/fold'
import type { CylinderState } from '~~/utils/custody/state'

/** What is kept of a cylinder, as the database and a phone keep it. */
function kept(state: CylinderState): CylinderState {
  return JSON.parse(JSON.stringify(state)) as CylinderState
}

/** Goes on with the last event of a story from what the ones before it had made. */
function goneOn(...story: Told[]) {
  const events = recorded(...story)
  return continueFold(kept(fold(events.slice(0, -1), FOLD_CONTEXT).state), events.slice(-1), FOLD_CONTEXT)
}

/** Goes on with a part of a log, held against all of it; whether that could be known. */
function isKnownAndSame(story: readonly Told[], cut: number): boolean {
  const events = recorded(...story)
  const [earlier, later] = [events.slice(0, cut), events.slice(cut)]
  const before = fold(earlier, FOLD_CONTEXT)
  const went = continueFold(kept(before.state), later, FOLD_CONTEXT)
  if (went === null) return false
  const whole = fold(events, FOLD_CONTEXT)
  const isLater = ({ eventId }: { eventId: string }) => later.some(({ id }) => id === eventId)
  expect(JSON.stringify(went)).toBe(JSON.stringify({
    state: whole.state,
    movements: whole.movements.filter(isLater),
    stockChanges: whole.stockChanges.filter(isLater),
    steps: whole.steps.filter(isLater),
    labelClaims: whole.labelClaims.filter(isLater),
  }))
  // Nothing of the earlier events says anything else than before.
  expect(JSON.stringify(whole.movements.filter(one => !isLater(one)))).toBe(JSON.stringify(before.movements))
  expect(JSON.stringify(whole.stockChanges.filter(one => !isLater(one)))).toBe(JSON.stringify(before.stockChanges))
  expect(JSON.stringify(whole.labelClaims.filter(one => !isLater(one)))).toBe(JSON.stringify(before.labelClaims))
  return true
}

/** The same story with its times in the order in which it is told, so that most cuts leave only later events behind. */
function inTime(story: readonly Told[]): Told[] {
  return story.map((told, index) => ({ ...told, more: { ...told.more, occurredAt: START + index * HOUR } }))
}

describe('going on from a kept state', () => {
  it('gives what the whole log gives, or says that it takes the whole log', () => {
    let known = 0
    fc.assert(fc.property(anyStory, fc.nat(12), fc.boolean(), (story, cut, isInTime) => {
      if (isKnownAndSame(isInTime ? inTime(story) : story, cut % (story.length + 1))) known++
    }), { numRuns: 300 })
    expect(known).toBeGreaterThan(60)
  })

  it('goes on event by event as far as the whole log at once', () => {
    const events = recorded(registered({ gross: kg(12) }), filled('R-22', 20), weighed(19.5), did('moved', { toPlaceId: SHOP }), filled('R-22', 25))
    let state = fold([], FOLD_CONTEXT).state
    for (const event of events) state = kept(continueFold(state, [event], FOLD_CONTEXT)!.state)
    expect(state).toEqual(fold(events, FOLD_CONTEXT).state)
  })

  it('books what the new weight shows, and nothing again', () => {
    expect(goneOn(registered({ gross: kg(12) }), filled('R-22', 20), weighed(19.5))!.movements).toMatchObject([
      { eventId: idOf(2), cause: 'weighing', refrigerant: 'R-22', grams: -500 },
    ])
  })

  it('begins with the first event of a cylinder', () => {
    const went = continueFold(fold([], FOLD_CONTEXT).state, recorded(registered({ gross: kg(12) })), FOLD_CONTEXT)!
    expect(went.state).toMatchObject({ version: 1, registeredAt: START, latestAt: START })
  })

  it('takes the whole log for an event at the very time of the last one, and none for one a millisecond later', () => {
    const at = START + HOUR
    expect(goneOn(registered(), weighed(20, { occurredAt: at }), weighed(21, { occurredAt: at }))).toBeNull()
    expect(goneOn(registered(), weighed(20, { occurredAt: at }), weighed(21, { occurredAt: at + 1 }))).not.toBeNull()
  })

  it('takes the whole log after a later event that was taken out, for that one still has its place', () => {
    const story = [registered(), weighed(20, { occurredAt: START + 5 * HOUR, recordedAt: START + 5 * HOUR }), corrected(idOf(1), undefined, { occurredAt: START + 2 * HOUR })]
    expect(goneOn(...story, weighed(21, { occurredAt: START + 4 * HOUR }))).toBeNull()
    expect(goneOn(...story, weighed(21, { occurredAt: START + 6 * HOUR }))).not.toBeNull()
  })

  it.each([
    ['a correction', corrected(idOf(1))],
    ['a signature', did('countersigned', { eventId: idOf(1) }, { actorId: SUPERVISOR })],
    ['another registration', registered()],
  ])('takes the whole log for %s', (_, last) => {
    expect(goneOn(registered(), weighed(20), last)).toBeNull()
  })

  it.each([
    ['a correction', corrected(idOf(3))],
    ['a signature', did('countersigned', { eventId: idOf(3) }, { actorId: SUPERVISOR })],
    ['a correction of a correction', corrected(idOf(1), { eventId: idOf(3), reason: 'the other line' })],
  ])('takes the whole log for an event that %s had named before it came', (_, early) => {
    expect(goneOn(registered(), weighed(20), early, weighed(21))).toBeNull()
    expect(goneOn(registered(), weighed(20), early, weighed(21, { id: idOf(9) }))).not.toBeNull()
  })

  it('takes the whole log to tell who last saw a cylinder that was given away', () => {
    const away = did('exchanged', { direction: 'out', exchangeId: idOf(50), otherCylinderId: OTHER_CYLINDER, firmId: SUPPLIER }, { placeId: SHOP })
    expect(goneOn(registered(), away, did('labelled', { code: '7K3M9Q2TX' }))).toBeNull()
    expect(goneOn(registered(), away, weighed(20))).not.toBeNull()
  })
})
