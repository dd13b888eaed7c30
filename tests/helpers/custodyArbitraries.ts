import fc from 'fast-check'
import {
  CUSTOMER, did, filled, HOUR, idOf, kg, LOT, OTHER_CYLINDER, RECLAIMER_PLACE, REQUALIFIER, SHIPMENT, SHOP, START, SUPPLIER, TECHNICIAN, TEST_PLACE, VAN,
  registered, type Told,
} from './custody'

/** Gross weights from below the tare of 12 kg to far above what 20 kg of water capacity may hold. */
const gross = fc.integer({ min: 1100, max: 4500 }).map(hundredths => kg(hundredths / 100))
const maybeGross = fc.option(gross, { nil: undefined })
const refrigerant = fc.constantFrom('R-22', 'R-410A', 'R-454B', 'R-744', 'R-9999')
const ofFill = fc.oneof(refrigerant, fc.constant(null))
const condition = fc.constantFrom('clean', 'suspect', 'burnt', 'mixed', 'unknown') as fc.Arbitrary<'clean' | 'suspect' | 'burnt' | 'mixed' | 'unknown'>

const direction = fc.constantFrom('out' as const, 'in' as const)
const pairId = fc.constantFrom('0198f000-0000-7000-8000-0000000000d1', '0198f000-0000-7000-8000-0000000000d2')

/** An event id among the first of a story. */
const someId = fc.integer({ min: 0, max: 11 }).map(idOf)

const contents = fc.oneof(
  fc.constant('evacuated' as const), fc.constant('unknown' as const), fc.record({ refrigerant, condition }),
)

const registration = fc.record({ contents, gross: maybeGross, ownership: fc.constantFrom('own' as const, 'customer' as const) })
  .map(details => registered({ ...details, ...(details.ownership === 'customer' ? { ownerId: CUSTOMER } : {}) }))

const happenings: fc.Arbitrary<Told>[] = [
  registration,
  fc.constantFrom('7K3M9Q2TX', '000000000').map(code => did('labelled', { code })),
  fc.record({ gross: maybeGross, fromFirmId: fc.constantFrom(undefined, SUPPLIER) }).map(details => did('received', details, { placeId: SHOP })),
  fc.constantFrom(SHOP, VAN).map(toPlaceId => did('moved', { toPlaceId, toHolderId: TECHNICIAN })),
  fc.constant(did('handed-over', { toHolderId: TECHNICIAN })),
  gross.map(reading => did('weighed', { gross: reading })),
  fc.record({ refrigerant: ofFill, condition: fc.option(condition, { nil: undefined }), before: maybeGross, after: gross, owner: fc.constantFrom(undefined, CUSTOMER), method: fc.constantFrom(undefined, 'own-compressor') })
    .map(({ refrigerant: name, condition: word, before, after, owner, method }) => filled(name, 0, {
      grossAfter: after, condition: word, grossBefore: before, ownerOfRefrigerantId: owner, method,
    })),
  fc.record({ grossAfter: gross, purpose: fc.constantFrom('same-system' as const, 'sampling' as const, 'other' as const), phase: fc.constantFrom(undefined, 'vapour' as const) })
    .map(details => did('drawn', details)),
  fc.record({ pressureKPa: fc.constantFrom(0, 500, 1_100, 2_500), temperatureC: fc.constantFrom(-60, 25, 90), barometerKPa: fc.constantFrom(undefined, 84.3) })
    .map(({ barometerKPa, pressureKPa, temperatureC }) => did('checked', {
      method: 'pressure', temperatureC, barometerKPa, pressureKPa: barometerKPa === undefined ? pressureKPa : pressureKPa + 20,
    })),
  fc.record({ method: fc.constantFrom('identifier' as const, 'laboratory' as const), name: ofFill, word: condition })
    .map(({ method, name, word }) => did('checked', { method, verdict: { refrigerant: name, condition: name === null && word === 'clean' ? 'unknown' : word } })),
  fc.record({ grossAfter: maybeGross, vacuum: fc.constantFrom(undefined, { microns: 500 }, { microns: 5000 }) }).map(details => did('emptied', details)),
  fc.record({ grossAfter: maybeGross, cause: fc.constantFrom('leak' as const, 'hose' as const) }).map(details => did('lost', details)),
  fc.constantFrom(undefined, 'dent' as const, 'leak' as const).map(found => did('inspected', found === undefined ? { result: 'sound' } : { result: 'damaged', reasons: [found] })),
  fc.constantFrom('an oily valve', 'waits for a look').map(reason => did('quarantined', { reason })),
  fc.constant(did('released', { reason: 'looked at' })),
  fc.constantFrom(undefined, 'on a roof').map(lastSeen => did('missing', { lastSeen })),
  fc.constantFrom(undefined, { certificate: 'S-114' }).map(proof => did('retired', { reason: 'scrapped', proof })),
  fc.constantFrom(undefined, SHOP, RECLAIMER_PLACE).map(placeId => did('found', { placeId })),
  gross.map(reading => did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: reading }, { placeId: RECLAIMER_PLACE })),
  fc.constant(did('reclaimed', { shipmentId: SHIPMENT })),
  fc.record({ direction, refrigerant: ofFill, condition, grossBefore: maybeGross, grossAfter: gross, ownerOfRefrigerantId: fc.constantFrom(undefined, CUSTOMER), transferId: pairId })
    .map(details => did('transferred', { counterpartId: OTHER_CYLINDER, ...details })),
  fc.record({ direction, exchangeId: pairId }).map(details => did('exchanged', { otherCylinderId: OTHER_CYLINDER, firmId: SUPPLIER, ...details }, { placeId: SHOP })),
  maybeGross.map(reading => did('returned', { fromFirmId: SUPPLIER, gross: reading }, { placeId: SHOP })),
  fc.constant(did('sent-for-test', { lotId: LOT }, { placeId: TEST_PLACE })),
  fc.record({
    method: fc.constantFrom('volumetric' as const, 'proof' as const, 'visual' as const),
    result: fc.constantFrom('passed' as const, 'passed' as const, 'rejected' as const, 'condemned' as const),
    newTare: fc.constantFrom(undefined, kg(11.9), kg(11)),
  }).map(details => did('retested', { month: '2026-07', requalifierId: REQUALIFIER, ...details })),
  someId.map(eventId => did('countersigned', { eventId })),
  fc.record({ eventId: someId, instead: someId }).map(({ eventId, instead }) => did('corrected', { eventId, reason: 'another line', instead: { eventId: instead } })),
  someId.map(eventId => did('corrected', { eventId, reason: 'a slip' })),
  fc.record({ eventId: someId, reading: gross }).map(({ eventId, reading }) => did('corrected', { eventId, reason: 'a slip', instead: { gross: reading } })),
]

function placed(told: fc.Arbitrary<Told>) {
  return fc.record({
    told,
    // Few instants, so that many events share one.
    hour: fc.integer({ min: 0, max: 6 }),
    device: fc.constantFrom('', 'phone-1', 'phone-2'),
    count: fc.integer({ min: 0, max: 3 }),
    trainee: fc.boolean(),
  })
}

// Nine stories of ten have a registration; the tenth is of a cylinder that nobody entered.
const beginning = fc.array(placed(registration), { minLength: 1, maxLength: 1 })
const noBeginning = fc.constant([])
const rest = fc.array(placed(fc.oneof(...happenings)), { minLength: 1, maxLength: 11 })

/** A story in which anything may happen at any time. */
export const anyStory: fc.Arbitrary<Told[]> = fc.tuple(fc.oneof({ weight: 9, arbitrary: beginning }, { weight: 1, arbitrary: noBeginning }), rest)
  .map(([first, others]) => [...first, ...others].map(({ told, hour, device, count, trainee }, index) => ({
    ...told,
    more: {
      ...told.more, id: idOf(index), occurredAt: START + hour * HOUR, recordedAt: START + 24 * HOUR, deviceId: device, deviceSeq: count, trainee,
    },
  })))
