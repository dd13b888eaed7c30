import { describe, expect, it } from 'vitest'
import { codes, did, filled, idOf, corrected, lastFindings, registered, REQUALIFIER, START, HOUR, viewAfter } from '~~/tests/helpers/custody'

const full = [registered(), filled('R-22', 20)]
const apart = (reason: string) => did('quarantined', { reason })
const released = did('released', { reason: 'identifier read R-22' })

describe('a cylinder set apart', () => {
  it('takes nothing more, and says why to whoever scans it', () => {
    expect(viewAfter(full)).toMatchObject({ lifecycle: 'in-service', holds: [], capacity: { stopWeightGrams: 28_000 } })
    const held = viewAfter([...full, apart('oil at the valve')])
    expect(held).toMatchObject({ lifecycle: 'quarantined', holds: ['quarantined'], capacity: { stopWeightGrams: null, roomGrams: null, fillLimitGrams: 16_000 } })
    expect(held.capacity.refusals.map(({ code }) => code)).toEqual(['quarantined'])
    expect(held.findings[0]).toMatchObject({ code: 'quarantined', severity: 'stop', text: 'Set apart: oil at the valve. Put nothing in until a manager releases it.' })
  })

  it('twice is held once, since the first time, for both reasons and no reason twice', () => {
    const held = viewAfter([...full, apart('oil at the valve.'), apart('smells burnt'), apart('oil at the valve.')])
    expect(held.holds).toEqual(['quarantined'])
    expect(held.findings[0]).toMatchObject({
      text: 'Set apart: oil at the valve; smells burnt. Put nothing in until a manager releases it.', since: new Date(START + 2 * HOUR).toISOString(),
    })
  })

  it('may still be taken along, weighed and drawn down; a fill into it is kept with a stop', () => {
    const held = viewAfter([...full, apart('oil at the valve')])
    for (const kind of ['moved', 'weighed', 'drawn', 'checked', 'emptied'] as const) expect(held.may, kind).toContain(kind)
    expect(held.may).not.toContain('filled')
    expect(lastFindings(...full, apart('oil at the valve'), filled('R-22', 21))).toContain('quarantined')
  })

  it('is in use again once it was released, and once more apart after a new reason alone', () => {
    expect(viewAfter([...full, apart('oil at the valve'), released])).toMatchObject({ lifecycle: 'in-service', holds: [], capacity: { stopWeightGrams: 28_000 } })
    expect(viewAfter([...full, apart('oil at the valve'), released, apart('no label')]).findings[0]!.text).toContain('Set apart: no label. Put')
  })

  it('was never apart where that is taken out of the log', () => {
    expect(codes(viewAfter([...full, apart('the wrong cylinder'), corrected(idOf(2))]))).toEqual([])
  })
})

describe('a release', () => {
  const tested = (result: 'rejected' | 'passed') => did('retested', { month: '2026-07', method: 'volumetric', result, requalifierId: REQUALIFIER })
  const damaged = did('inspected', { result: 'damaged', reasons: ['dent'] })

  it('lifts that hold and no other', () => {
    expect(viewAfter([registered(), tested('rejected'), damaged, apart('no label'), released])).toMatchObject({ lifecycle: 'rejected', holds: ['wet', 'rejected', 'damaged'] })
    expect(viewAfter([registered(), apart('no label'), tested('passed')]).holds).toEqual(['quarantined', 'wet'])
  })

  it('of a cylinder that is not set apart does nothing, and is no plan', () => {
    const manager = { access: { personId: 'm', roles: ['manager' as const], trainee: false } }
    expect(viewAfter([...full, released], manager)).toMatchObject({ lifecycle: 'in-service', holds: [], findings: [] })
    expect(viewAfter(full, manager).mayNot).toContainEqual({ kind: 'released', because: 'It is not set apart.' })
    expect(viewAfter([...full, apart('no label')], manager).may).toContain('released')
    expect(viewAfter([...full, apart('no label')]).mayNot).toContainEqual({ kind: 'released', because: 'Another role records this.' })
  })
})
