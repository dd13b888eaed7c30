import { describe, expect, it } from 'vitest'
import {
  codes, corrected, CYLINDER, DAY, did, filled, folded, HOUR, idOf, kg, lastFindings, lastMovements, LOT, recorded, RECLAIMER_PLACE, registered, REQUALIFIER, SHIPMENT, SHOP, START,
  SUPPLIER, TECHNICIAN, TEST_PLACE, VAN, viewAfter, weighed, type Told,
} from '~~/tests/helpers/custody'

const onVan = [registered(), filled('R-22', 20), did('moved', { toPlaceId: VAN, toHolderId: TECHNICIAN })]
const missing = did('missing', { lastSeen: 'Friday, by the roof door' })
const found = (placeId?: string) => did('found', placeId === undefined ? {} : { placeId })
const lost = [...onVan, missing]

describe('a missing cylinder', () => {
  it('shows as missing, with what is in it, its place and its holder as they were last known', () => {
    expect(viewAfter(lost)).toMatchObject({
      lifecycle: 'missing', place: { id: VAN }, holder: { id: TECHNICIAN }, contents: { netGrams: 8000, refrigerant: 'R-22', inStock: true },
    })
    expect(lastMovements(...lost)).toEqual([])
  })

  it('is in no plan to fill, take, draw or check, and says where it was seen last', () => {
    const view = viewAfter(lost)
    expect(view.capacity).toMatchObject({ stopWeightGrams: null, roomGrams: null })
    expect(view.capacity.refusals.map(({ code, text }) => [code, text])).toEqual([
      ['away', 'By the log it is missing. Last seen: Friday, by the roof door. If it stands before you, record that it was found.'],
    ])
    for (const kind of ['filled', 'moved', 'handed-over', 'drawn', 'checked', 'missing'] as const) expect(view.may, kind).not.toContain(kind)
    for (const kind of ['found', 'weighed', 'received'] as const) expect(view.may, kind).toContain(kind)
    expect(viewAfter(onVan).mayNot).toContainEqual({ kind: 'found', because: 'It is not missing.' })
  })

  it('reported twice is missing since the first time, seen last where the later report says', () => {
    const twice = folded(...lost, did('missing', {}), did('missing', { lastSeen: 'Monday, at the gate' })).state
    expect(twice.missing).toEqual({ since: START + 3 * HOUR, lastSeen: 'Monday, at the gate' })
    expect(folded(...lost, did('missing', {})).state.missing?.lastSeen).toBe('Friday, by the roof door')
  })

  it('is not asked after by its days as well', () => {
    expect(codes(viewAfter(onVan, { nowMs: START + 31 * DAY }))).toEqual(['not-seen'])
    expect(codes(viewAfter(lost, { nowMs: START + 31 * DAY }))).toEqual([])
  })

  it('that nobody has seen since counts its days from before it was reported', () => {
    const reported = [...onVan, { ...missing, more: { occurredAt: START + 20 * DAY } }]
    expect(folded(...reported).state.lastSeenAt).toBe(START + 2 * HOUR)
    expect(folded(...reported, { ...found(), more: { occurredAt: START + 25 * DAY } }).state.lastSeenAt).toBe(START + 25 * DAY)
  })

  it('stays missing on paper: by a label, by a correction', () => {
    expect(viewAfter([...lost, did('labelled', { code: '7K3M9Q2TX' })]).lifecycle).toBe('missing')
    expect(viewAfter([...lost, corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(21), looked: true })])).toMatchObject({ lifecycle: 'missing', contents: { netGrams: 9000 } })
    expect(viewAfter([...lost, corrected(idOf(3))]).lifecycle).toBe('in-service')
  })
})

describe('a missing cylinder that is used', () => {
  const uses: [string, Told][] = [
    ['weighed', weighed(20)],
    ['moved', did('moved', { toPlaceId: SHOP })],
    ['handed over', did('handed-over', { toHolderId: TECHNICIAN })],
    ['filled', filled('R-22', 21)],
    ['drawn', did('drawn', { grossAfter: kg(19), purpose: 'same-owner' })],
    ['checked', did('checked', { method: 'laboratory', verdict: { refrigerant: 'R-22', condition: 'clean' } })],
    ['emptied', did('emptied', { vacuum: { microns: 500 } })],
    ['lost from', did('lost', { cause: 'hose', grossAfter: kg(19) })],
    ['looked over', did('inspected', { result: 'sound' })],
    ['set apart', did('quarantined', { reason: 'found on a roof' })],
    ['received', did('received', {}, { placeId: SHOP })],
    ['returned', did('returned', { fromFirmId: SUPPLIER }, { placeId: SHOP })],
    ['sent for reclaim', did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(20) }, { placeId: RECLAIMER_PLACE })],
    ['sent for test', did('sent-for-test', { lotId: LOT }, { placeId: TEST_PLACE })],
    ['retested', did('retested', { month: '2026-07', method: 'visual', result: 'passed', requalifierId: REQUALIFIER })],
    ['registered again', registered()],
  ]

  it.each(uses)('is missing no longer once it was %s, with a caution on that line', (_, use) => {
    expect(folded(...lost, use).state.missing).toBeNull()
    expect(lastFindings(...lost, use)).toContain('found-by-use')
    expect(lastFindings(...onVan, use)).not.toContain('found-by-use')
  })

  it('earlier in effect was not missing yet, whenever that arrives', () => {
    const before = { ...weighed(20), more: { occurredAt: START + 2.5 * HOUR, recordedAt: START + 9 * HOUR } }
    const state = folded(...lost, before).state
    expect(state.missing).not.toBeNull()
    expect(recorded(...lost, before).at(-1)).toMatchObject({ cylinderId: CYLINDER, kind: 'weighed' })
  })
})

describe('a cylinder that was found', () => {
  it('is in service again, with whom it was', () => {
    expect(viewAfter([...lost, found()])).toMatchObject({ lifecycle: 'in-service', place: { id: VAN }, holder: { id: TECHNICIAN }, capacity: { stopWeightGrams: 28_000 } })
    expect(lastFindings(...lost, found())).toEqual([])
    expect(lastMovements(...lost, found())).toEqual([])
  })

  it('elsewhere stands there, in nobody\'s hands', () => {
    expect(viewAfter([...lost, found(SHOP)])).toMatchObject({ lifecycle: 'in-service', place: { id: SHOP }, holder: null })
    expect(viewAfter([...lost, found(VAN)])).toMatchObject({ place: { id: VAN }, holder: { id: TECHNICIAN } })
  })

  it('at the reclaimer it was sent to is there; anywhere else it is back, with a stop', () => {
    const astray = [...onVan, did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(20) }, { placeId: RECLAIMER_PLACE }), missing]
    expect(viewAfter(astray).lifecycle).toBe('missing')
    expect(viewAfter([...astray, found(RECLAIMER_PLACE)])).toMatchObject({ lifecycle: 'at-reclaim', contents: { inStock: false } })
    expect(viewAfter([...astray, found(SHOP)])).toMatchObject({ lifecycle: 'in-service', place: { id: SHOP }, contents: { inStock: true, netGrams: 8000 } })
    expect(lastFindings(...astray, found(SHOP))).toEqual(['away'])
    expect(lastMovements(...astray, found(SHOP))).toEqual(['opening R-22 8000'])
  })

  it('without having been missed only says where it is', () => {
    expect(viewAfter([...onVan, found(SHOP)])).toMatchObject({ lifecycle: 'in-service', place: { id: SHOP }, findings: [] })
  })
})
