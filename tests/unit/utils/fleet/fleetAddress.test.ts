import { describe, expect, it } from 'vitest'
import { fleetQuery } from '../../../../utils/contract/custody'
import { changeFleetAddress, readFleetAddress } from '../../../../utils/fleet/fleetAddress'

describe('the address of a fleet list', () => {
  it('asks for the most urgent hundred where it says nothing', () => {
    expect(readFleetAddress({})).toEqual({ limit: 100, sort: 'urgency', order: 'asc' })
  })

  it('leaves out what it cannot read, so that an old address still opens', () => {
    expect(readFleetAddress({ sort: 'colour', place: 'van 12', dueBefore: '2027-13', finding: 'overfill', unheard: 'of' }))
      .toEqual({ limit: 100, sort: 'urgency', order: 'asc', finding: 'overfill' })
  })

  it('begins at the first page again when the question changes, and keeps the other filters', () => {
    expect(changeFleetAddress({ refrigerant: 'R-22', cursor: 'abc', sort: 'net' }, { finding: 'not-seen' }))
      .toEqual({ refrigerant: 'R-22', sort: 'net', finding: 'not-seen' })
  })

  it('stays in the past while the question changes, until that is cleared', () => {
    const past = { asOf: '2026-12-01T15:30:00Z' }
    expect(changeFleetAddress({ ...past, refrigerant: 'R-22' }, { refrigerant: null })).toEqual(past)
    expect(changeFleetAddress(past, { asOf: null })).toEqual({})
  })

  it('clears one filter, and turns the page', () => {
    expect(changeFleetAddress({ refrigerant: 'R-22', q: 'K48' }, { q: null })).toEqual({ refrigerant: 'R-22' })
    expect(changeFleetAddress({ refrigerant: 'R-22' }, { cursor: 'next' })).toEqual({ refrigerant: 'R-22', cursor: 'next' })
  })
})

describe('a part of a fleet address', () => {
  const id = '0190A6C0-1F2B-7c3d-8e4f-5a6b7c8d9e0f'
  const cases: Record<string, { read: string[], leftOut: string[] }> = {
    q: { read: ['K48', 'K'.repeat(80), ' R-22 '], leftOut: ['K'.repeat(81)] },
    place: { read: [id], leftOut: ['van 12', id.replace('7c3d', '0c3d'), `${id}0`] },
    holder: { read: [id], leftOut: ['Wes'] },
    owner: { read: [id], leftOut: [id.replace('8e4f', '7e4f')] },
    refrigerant: { read: ['R-22', 'R'.repeat(40)], leftOut: ['R'.repeat(41)] },
    condition: { read: ['burnt'], leftOut: ['new', 'Burnt'] },
    lifecycle: { read: ['at-test', 'retired'], leftOut: ['lost'] },
    dueBefore: { read: ['2027-12'], leftOut: ['2027-13', '2027-1', 'March'] },
    finding: { read: ['overfill'], leftOut: ['f'.repeat(41)] },
    label: { read: ['K7Q2M4XW'], leftOut: ['K'.repeat(21)] },
    sort: { read: ['net', 'last-event'], leftOut: ['colour'] },
    order: { read: ['desc'], leftOut: ['up'] },
    asOf: { read: ['2026-12-01T09:30:00-06:00', '2026-12-01T15:30:00Z'], leftOut: ['2026-12-01', '2026-12-01T15:30Z', '2026-12-01T09:30:00', 'noon'] },
    knownAt: { read: ['2026-12-01T15:30:00.123Z'], leftOut: ['2026-13-01T00:00:00Z'] },
    cursor: { read: ['c'.repeat(600)], leftOut: ['c'.repeat(601)] },
  }

  it('is tried here for each that the route takes, but for how many', () => {
    expect([...Object.keys(cases), 'limit'].sort()).toEqual(Object.keys(fleetQuery.shape).sort())
  })

  it.each(Object.entries(cases))('is read as the route would: %s', (key, { read, leftOut }) => {
    const nothing = readFleetAddress({})
    for (const value of read) {
      expect(readFleetAddress({ [key]: value }), value).toEqual({ ...nothing, ...fleetQuery.parse({ limit: 100, [key]: value }) })
    }
    for (const value of leftOut) {
      expect(readFleetAddress({ [key]: value }), value).toEqual(nothing)
      expect(fleetQuery.safeParse({ [key]: value }).success, value).toBe(false)
    }
  })
})
