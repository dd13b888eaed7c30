import { describe, expect, it } from 'vitest'
import { CYLINDER, did, filled, registered, SHOP, TECHNICIAN, VAN, viewAfter, type Told } from '~~/tests/helpers/custody'
import { batchEvent } from '~~/utils/batch/batchAct'
import { batchVerdict, type BatchQuestion } from '~~/utils/batch/batchVerdict'

const LABEL = did('labelled', { code: '7K3M9Q2TX' })
const SOUND = [registered(), LABEL, filled('R-22', 20)]
const OVERFILLED = [registered(), LABEL, filled('R-22', 29)]
const ON_VAN = { id: VAN, name: 'Van 12' }

function said(story: Told[], question: Partial<BatchQuestion> = {}, codesOnTwo = new Set<string>()) {
  const view = viewAfter(story, { codesOnTwo })
  return batchVerdict(view, { act: 'load', target: ON_VAN, expectedIds: null, keepReason: null, isChosen: false, ...question }, 'kg')
}

describe('a cylinder scanned for a van', () => {
  it('counts, with what is in it and its room', () => {
    expect(said(SOUND)).toEqual({ standing: 'counted', kind: 'ok', text: 'R-22, room 8.00\u00A0kg', against: [] })
  })

  it('is refused with its reason where it is overfilled, and counts with one of the person\'s own', () => {
    const refused = said(OVERFILLED)
    expect(refused).toMatchObject({ standing: 'refused', kind: 'stop', against: ['overfill'] })
    expect(refused.text).toMatch(/^Not this cylinder\. /)
    expect(said(OVERFILLED, { keepReason: 'aboard already' })).toEqual({ standing: 'counted', kind: 'att', text: 'Kept: aboard already', against: ['overfill'] })
  })

  it('is refused where a list is loaded and it is not on it', () => {
    expect(said(SOUND, { expectedIds: new Set(['another']) })).toEqual({ standing: 'refused', kind: 'stop', text: 'Not this cylinder. It is not on the list.', against: [] })
    expect(said(SOUND, { expectedIds: new Set([CYLINDER]) })).toMatchObject({ standing: 'counted', kind: 'ok' })
    // A list that expects nothing takes nothing; no list takes all.
    expect(said(SOUND, { expectedIds: new Set() }).standing).toBe('refused')
  })

  it('has nothing to record where it is aboard already', () => {
    expect(said([...SOUND, did('moved', { toPlaceId: VAN })])).toMatchObject({ standing: 'there', kind: 'att' })
    expect(said([...SOUND, did('moved', { toPlaceId: SHOP })]).standing).toBe('counted')
  })

  it('is asked for by its serial where its code is on two, and counts once that was said', () => {
    const onTwo = new Set(['7K3M9Q2TX'])
    expect(said(SOUND, {}, onTwo)).toMatchObject({ standing: 'which', kind: 'stop' })
    expect(said(SOUND, { isChosen: true }, onTwo).standing).toBe('counted')
  })
})

describe('a cylinder scanned off a van', () => {
  it('counts whatever it is: that it came is a fact', () => {
    const shop = { act: 'unload' as const, target: { id: SHOP, name: 'North shop' } }
    const aboard = did('moved', { toPlaceId: VAN })
    expect(said([...OVERFILLED, aboard], shop)).toMatchObject({ standing: 'counted', kind: 'stop' })
    expect(said([...SOUND, aboard], { ...shop, expectedIds: new Set() })).toMatchObject({ standing: 'counted', kind: 'att', text: 'R-22, room 8.00\u00A0kg, not on the list' })
  })

  it('counts when it is received at the place where the log has it', () => {
    expect(said(SOUND, { act: 'receive', target: { id: SHOP, name: 'North shop' } }).standing).toBe('counted')
  })
})

describe('the event of a batch', () => {
  const line = { cylinderId: CYLINDER, scannedAt: '2026-07-01T12:00:00-05:00', keepReason: null, confirmed: [] }

  it('puts the cylinder into the hands of the van\'s technician, at the time of its scan', () => {
    expect(batchEvent('load', { ...ON_VAN, technicianId: TECHNICIAN }, line, null)).toEqual({
      cylinderId: CYLINDER, kind: 'moved', occurredAt: '2026-07-01T12:00:00-05:00', details: { toPlaceId: VAN, toHolderId: TECHNICIAN },
    })
  })

  it('has no holder where nobody has the place', () => {
    expect(batchEvent('unload', { id: SHOP, name: 'North shop', technicianId: null }, line, null).details).toEqual({ toPlaceId: SHOP })
  })

  it('says where a received one came in, why a refused one was kept, and who supervised', () => {
    expect(batchEvent('receive', { id: SHOP, name: 'North shop', technicianId: null }, { ...line, keepReason: 'told to', confirmed: ['overfill'] }, TECHNICIAN)).toEqual({
      cylinderId: CYLINDER, kind: 'received', occurredAt: '2026-07-01T12:00:00-05:00', placeId: SHOP,
      supervisorId: TECHNICIAN, note: 'told to', confirmed: ['overfill'], details: {},
    })
  })
})
