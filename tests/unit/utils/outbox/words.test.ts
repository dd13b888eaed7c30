import { describe, expect, it } from 'vitest'
import { waitAfter } from '../../../../utils/outbox/backOff'
import { needsServer } from '../../../../utils/outbox/needsServer'
import { sameContent } from '../../../../utils/outbox/sameContent'
import type { CustodyEvent } from '../../../../utils/custody/event'
import { ageWords, problemWords, savedWords, waitingWords } from '../../../../utils/outbox/words'

const event = { id: 'e', cylinderId: 'c', kind: 'filled', occurredAt: '2026-12-01T09:00:00-06:00', deviceId: 'd', deviceSeq: 0, details: { refrigerant: 'R-22' } } as CustodyEvent

describe('what waits, in words', () => {
  it('says how many and how long', () => {
    expect(waitingWords(3)).toBe('3 waiting to send')
    expect([ageWords(59_999), ageWords(60_000), ageWords(25 * 3_600_000)]).toEqual(['just now', 'oldest 1 min', 'oldest 1 d 1 h'])
  })

  it('names what was saved, or how much of it', () => {
    expect(savedWords([event])).toBe('Saved on this phone, waiting to send: filled')
    expect(savedWords([event, event])).toBe('Saved on this phone, waiting to send: 2 entries')
  })

  it('says every part of a problem, the fields by what a person calls them', () => {
    const errors = [{ path: 'placeId', message: 'no such place' }, { path: 'details.grossAfter.value', message: 'below zero' }, { path: '', message: 'too long' }]
    expect(problemWords({ type: 'about:blank', title: 'No', status: 422, detail: 'Choose again.', errors }))
      .toBe('Choose again. place: no such place gross after: below zero too long')
  })
})

describe('what cannot wait for the server', () => {
  it('is a decision on the cylinder as it stands, and no fact', () => {
    expect((['released', 'retired', 'reclaimed', 'corrected', 'sent-for-reclaim', 'sent-for-test'] as const).map(kind => needsServer({ kind }))).toEqual(Array(6).fill(true))
    expect((['filled', 'weighed', 'transferred', 'countersigned', 'registered', 'lost'] as const).map(kind => needsServer({ kind }))).toEqual(Array(6).fill(false))
    expect(needsServer({ kind: 'moved', expects: 3 })).toBe(true)
  })
})

describe('the same event again', () => {
  it('is known by its content, whatever its number and the order of its parts', () => {
    const { kind, id, ...rest } = event
    expect(sameContent(event, { ...rest, id, kind, deviceSeq: 7 })).toBe(true)
    expect(sameContent(event, { ...event, details: { refrigerant: 'R-410A' } as never })).toBe(false)
  })
})

describe('the wait before the next try', () => {
  it('grows with the tries that failed, up to five minutes', () => {
    expect([0, 1, 2, 3, 4, 50].map(waitAfter)).toEqual([5_000, 5_000, 15_000, 60_000, 300_000, 300_000])
  })
})
