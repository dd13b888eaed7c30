import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import {
  CUSTOMER, CYLINDER, did, filled, FOLD_CONTEXT, idOf, kg, LOT, OTHER_CYLINDER, RECLAIMER_PLACE, recorded, registered, REQUALIFIER, SHIPMENT, SHOP, SUPERVISOR,
  SUPPLIER, TECHNICIAN, TEST_PLACE, VAN, VIEW_CONTEXT, weighed, type Told,
} from '~~/tests/helpers/custody'
import { fold } from '~~/utils/custody/fold'
import { FOLD_MEANING } from '~~/utils/custody/foldMeaning'
import { EVENT_KINDS } from '~~/utils/custody/kinds'
import { cacheRow } from '~~/utils/custody/row'

const pair = '0198f000-0000-7000-8000-0000000000d1'
const transfer = { transferId: pair, counterpartId: OTHER_CYLINDER, refrigerant: 'R-22', condition: 'clean' as const }

/** Logs that hold every kind, most of them twice, and that nobody changes: their fold is the measure. */
const LOGS: Told[][] = [
  [
    registered({ contents: 'evacuated', gross: kg(12) }),
    did('labelled', { code: '7K3M9Q2TX' }),
    did('moved', { toPlaceId: VAN, toHolderId: TECHNICIAN }),
    filled('R-22', 20, { grossBefore: kg(12), condition: 'suspect' }),
    filled('R-22', 25, { grossBefore: kg(20.2), ownerOfRefrigerantId: CUSTOMER }, { trainee: true, supervisorId: SUPERVISOR }),
    did('countersigned', { eventId: idOf(4) }, { actorId: SUPERVISOR }),
    did('drawn', { grossAfter: kg(23), purpose: 'other', phase: 'vapour' }),
    did('transferred', { ...transfer, direction: 'out', grossBefore: kg(23), grossAfter: kg(21) }),
    did('lost', { grossAfter: kg(20.5), cause: 'leak' }),
    did('corrected', { eventId: idOf(8), reason: 'misread', instead: { grossAfter: kg(20.8), cause: 'hose' } }),
    did('returned', { fromFirmId: SUPPLIER, gross: kg(20.7) }, { placeId: SHOP }),
    did('handed-over', { toHolderId: SUPERVISOR }),
    did('missing', { lastSeen: 'on a roof' }),
    did('found', { placeId: SHOP }),
    did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(20.6) }, { placeId: RECLAIMER_PLACE }),
    did('reclaimed', { shipmentId: SHIPMENT, theirGross: kg(20.5) }),
    did('received', { gross: kg(12), fromFirmId: SUPPLIER }, { placeId: SHOP }),
    did('sent-for-test', { lotId: LOT }, { placeId: TEST_PLACE }),
    did('retested', { month: '2026-07', method: 'volumetric', result: 'passed', requalifierId: REQUALIFIER, newTare: kg(11.9) }),
    did('emptied', { vacuum: { microns: 500 } }),
  ],
  [
    registered({ contents: 'unknown', gross: kg(17), ownership: 'customer', ownerId: CUSTOMER }),
    did('checked', { method: 'identifier', verdict: { refrigerant: 'R-410A', condition: 'clean' } }),
    did('transferred', { ...transfer, direction: 'in', grossBefore: kg(17), grossAfter: kg(18) }),
    weighed(29),
    did('quarantined', { reason: 'an oily valve' }),
    did('released', { reason: 'looked at' }),
    did('inspected', { result: 'damaged', reasons: ['dent'] }),
    did('exchanged', { direction: 'out', exchangeId: pair, otherCylinderId: OTHER_CYLINDER, firmId: SUPPLIER }, { placeId: SHOP }),
    did('exchanged', { direction: 'in', exchangeId: pair, otherCylinderId: OTHER_CYLINDER, firmId: SUPPLIER }, { placeId: SHOP }),
    did('emptied', { grossAfter: kg(12.5) }),
    did('retired', { reason: 'scrapped' }),
    weighed(12.4),
  ],
]

/** What the fold made of {@link LOGS} under each number. */
const MADE: Record<number, string> = {
  1: '0b97ed1ae71c9e11',
  2: '0b97ed1ae71c9e11',
  3: '0b97ed1ae71c9e11',
  4: '0b97ed1ae71c9e11',
  5: '0b97ed1ae71c9e11',
  6: '064cb505b5f43d86',
  7: 'c85ef4a0d707aad8',
  8: '53d56540c26915e5',
}

describe('the number of what the fold means', () => {
  it('has logs of every kind to be measured by', () => {
    expect(new Set(LOGS.flat().map(({ kind }) => kind))).toEqual(new Set(EVENT_KINDS))
  })

  // Fails where the fold makes something else of old events: then raise FOLD_MEANING and write the new value beside it.
  it('goes up whenever the same log makes other caches', () => {
    const made = LOGS.map((log) => {
      const { state, movements, stockChanges, labelClaims } = fold(recorded(...log), FOLD_CONTEXT)
      expect(state.id).toBe(CYLINDER)
      return [state, movements, stockChanges, labelClaims, cacheRow(state, VIEW_CONTEXT)]
    })
    expect(createHash('sha256').update(JSON.stringify(made)).digest('hex').slice(0, 16)).toBe(MADE[FOLD_MEANING])
  })
})
