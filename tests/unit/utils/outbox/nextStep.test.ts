import { describe, expect, it } from 'vitest'
import type { CustodyEvent } from '../../../../utils/custody/event'
import { newEntry, type OutboxEntry } from '../../../../utils/outbox/entry'
import { HOLD_MS, nextStep } from '../../../../utils/outbox/nextStep'

const NOON = 1_800_000_000_000

function entry(seq: number, more: Partial<OutboxEntry> = {}, event: Partial<CustodyEvent> = {}): OutboxEntry {
  const made = { id: `e${seq}`, cylinderId: 'c', kind: 'weighed', occurredAt: '', deviceId: 'd', deviceSeq: seq, details: {}, ...event } as CustodyEvent
  return { ...newEntry(made, 'tina', NOON - 60_000), ...more }
}

const step = (entries: OutboxEntry[], more: Partial<Parameters<typeof nextStep>[1]> = {}) => {
  const next = nextStep(entries, { personId: 'tina', nowMs: NOON, most: 200, byHand: false, ...more })
  return next.is === 'send' ? next.entries.map(({ id }) => id) : next
}

describe('what is sent next', () => {
  it('is everything of the person who is signed in, in the order of the device\'s count', () => {
    expect(step([entry(3), entry(1), entry(2, { personId: 'wes' }), entry(4)])).toEqual(['e1', 'e3', 'e4'])
  })

  it('is nothing where all is refused or somebody else\'s', () => {
    expect(step([entry(1, { state: 'refused' }), entry(2, { personId: 'wes' })])).toEqual({ is: 'done' })
  })

  it('is also what was being sent when the page was closed', () => {
    expect(step([entry(1, { state: 'sending', firstSentAt: NOON - 5000 }), entry(2)])).toEqual(['e1', 'e2'])
  })

  it('is at most as many as go in one request', () => {
    expect(step([1, 2, 3].map(seq => entry(seq)), { most: 2 })).toEqual(['e1', 'e2'])
  })
})

describe('long entries', () => {
  const long = (seq: number) => entry(seq, {}, { note: 'n'.repeat(60_000) })

  it('go in as many requests as the server takes them in', () => {
    expect(step([long(1), long(2), long(3), entry(4)])).toEqual(['e1', 'e2'])
  })

  it('go alone where they are longer than that, for only the server can refuse them', () => {
    expect(step([entry(1, {}, { note: 'n'.repeat(200_000) }), entry(2)])).toEqual(['e1'])
  })
})

describe('what was saved last', () => {
  const young = (ageMs: number) => entry(2, { queuedAt: NOON - ageMs })

  it('is held for ten seconds, so that it can be taken back, while what was saved before it goes', () => {
    expect(step([entry(1), young(HOLD_MS - 1)])).toEqual(['e1'])
    expect(step([entry(1), young(HOLD_MS)])).toEqual(['e1', 'e2'])
  })

  it('alone is waited for until then', () => {
    expect(step([young(4000)])).toEqual({ is: 'wait', untilMs: NOON + 6000 })
  })

  it('goes at once by hand', () => {
    expect(step([young(0)], { byHand: true })).toEqual(['e2'])
  })

  it('goes as soon as another follows it', () => {
    expect(step([young(5000), entry(3, { queuedAt: NOON - 1000 })])).toEqual(['e2'])
  })

  it('is held with all that was saved together with it', () => {
    expect(step([young(1000), entry(3, { queuedAt: NOON - 1000 })])).toEqual({ is: 'wait', untilMs: NOON + 9000 })
  })

  it('is not held where it was tried before', () => {
    expect(step([{ ...young(1000), tries: 1 }])).toEqual(['e2'])
  })

  it('is not held for ever by a clock that was set back', () => {
    expect(step([young(-3_600_000)])).toEqual(['e2'])
  })
})

describe('the halves of a transfer', () => {
  const half = (seq: number, transferId: string, cylinderId: string) => entry(seq, {}, { kind: 'transferred', cylinderId, details: { transferId } as never })
  const A = '0190a000-0000-7000-8000-00000000000a'

  it('go in one request, also where only one more would fit', () => {
    expect(step([entry(1), half(2, A, 'c1'), half(3, A, 'c2'), entry(4)], { most: 2 })).toEqual(['e1'])
    expect(step([entry(1), half(2, A, 'c1'), half(3, A, 'c2'), entry(4)], { most: 3 })).toEqual(['e1', 'e2', 'e3'])
  })

  it('are one where requests are made smaller', () => {
    expect(step([half(2, A, 'c1'), half(3, A, 'c2')], { most: 1 })).toEqual(['e2', 'e3'])
  })
})
