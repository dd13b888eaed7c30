import { describe, expect, it } from 'vitest'
import type { CustodyEvent } from '../../../../utils/custody/event'
import { newEntry } from '../../../../utils/outbox/entry'
import { settlementOf } from '../../../../utils/outbox/settlement'

const entry = (id: string, more: Partial<CustodyEvent> = {}) =>
  newEntry({ id, cylinderId: 'c', kind: 'weighed', occurredAt: '', deviceId: 'd', deviceSeq: 1, details: {}, ...more } as CustodyEvent, 'tina', 0)
const [ONE, TWO] = [entry('one'), entry('two')]
const failure = (status: number, type = 'about:blank') => settlementOf([ONE, TWO], { problem: { type, title: 'No', status, detail: '' } })
const NOTHING = { recorded: [], refused: [], kept: [] }

describe('an answer with a verdict on each event', () => {
  it('takes out what was recorded now or before, and keeps what was refused with its problem', () => {
    const problem = { type: 'about:blank', title: 'It names what nobody knows', status: 422, detail: '' }
    const results = [{ id: 'one', outcome: 'duplicate', version: 4 }, { id: 'two', outcome: 'refused', problem }]
    expect(settlementOf([ONE, TWO], { body: { results } })).toEqual({
      recorded: [{ id: 'one', cylinderId: 'c', version: 4 }], refused: [{ id: 'two', problem }], kept: [], pause: null, split: false,
    })
  })

  it('refuses what the log has under the same id with other content', () => {
    const problem = { type: 'about:blank', title: 'Recorded already', status: 409, detail: '' }
    expect(settlementOf([ONE], { body: { results: [{ id: 'one', outcome: 'refused', problem }] } }).refused).toEqual([{ id: 'one', problem }])
  })
})

describe('an answer without a verdict on an event', () => {
  it.each([
    ['a page of a network that wants its guests to sign in', '<html>Welcome</html>'],
    ['nothing', undefined],
    ['another event', { results: [{ id: 'three', outcome: 'accepted', version: 1 }] }],
    ['a verdict of a later version', { results: [{ id: 'one', outcome: 'later' }, { id: 'two', outcome: 'later' }] }],
    ['accepted without a line in the log', { results: [{ id: 'one', outcome: 'accepted' }, { id: 'two', outcome: 'accepted' }] }],
    ['refused for a fault of the server', { results: ['one', 'two'].map(id => ({ id, outcome: 'refused', problem: { title: 'Full', status: 503 } })) }],
  ])('keeps it: %s', (_what, body) => {
    const kept = [ONE, TWO].map(({ id }) => ({ id, problem: null, mayHaveArrived: true }))
    expect(settlementOf([ONE, TWO], { body })).toEqual({ ...NOTHING, kept, pause: 'server', split: false })
  })

  it('keeps only that one', () => {
    const { recorded, kept } = settlementOf([ONE, TWO], { body: { results: [{ id: 'two', outcome: 'accepted', version: 2 }] } })
    expect([recorded.map(({ id }) => id), kept.map(({ id }) => id)]).toEqual([['two'], ['one']])
  })
})

describe('a request that failed', () => {
  it.each([
    [0, 'offline', true], [401, 'sign-in', false], [403, 'server', false], [408, 'server', true], [404, 'server', true], [409, 'server', true],
    [429, 'server', false], [500, 'server', true], [502, 'server', true], [503, 'server', true], [504, 'server', true],
  ] as const)('with %i keeps all, and waits for: %s', (status, pause, mayHaveArrived) => {
    const { kept, ...rest } = failure(status)
    expect(rest).toEqual({ recorded: [], refused: [], pause, split: false })
    expect(kept.map(each => [each.id, each.problem?.status, each.mayHaveArrived])).toEqual([['one', status, mayHaveArrived], ['two', status, mayHaveArrived]])
  })

  it.each([[400, 'server'], [422, 'server'], [413, null]] as const)('with %i, said by something on the way, waits for: %s', (status, pause) => {
    const settled = settlementOf([ONE, TWO], { problem: { type: 'about:blank', title: 'No', status, detail: '' }, isOfBetween: true })
    expect([settled.refused, settled.kept.length, settled.pause, settled.split]).toEqual([[], 2, pause, pause === null])
  })

  it('because somebody else is signed in waits for its author', () => {
    expect(failure(403, 'not-its-author').pause).toBe('sign-in')
  })

  it.each([400, 413, 422])('with %i for what is in it is divided, and refuses the one at fault once it is alone', (status) => {
    expect(failure(status)).toMatchObject({ recorded: [], refused: [], pause: null, split: true })
    const alone = settlementOf([ONE], { problem: { type: 'about:blank', title: 'No', status, detail: '' } })
    expect(alone).toMatchObject({ refused: [{ id: 'one', problem: { status } }], kept: [], pause: null, split: false })
  })

  it('refuses both halves of a transfer, which are not divided', () => {
    const details = { transferId: '0190a000-0000-7000-8000-00000000000a' } as never
    const halves = [entry('out', { kind: 'transferred', details }), entry('in', { kind: 'transferred', cylinderId: 'd', details })]
    const { refused, split } = settlementOf(halves, { problem: { type: 'about:blank', title: 'No', status: 422, detail: '' } })
    expect([refused.map(({ id }) => id), split]).toEqual([['out', 'in'], false])
  })
})
