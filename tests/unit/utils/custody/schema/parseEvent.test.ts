import { describe, expect, it } from 'vitest'
import { parseEvent } from '~~/utils/custody/schema/parseEvent'
import { CYLINDER, idOf, kg, OTHER_CYLINDER, SHIPMENT, SHOP, STAMP, SUPPLIER } from '~~/tests/helpers/custody'

const sound = { id: idOf(1), cylinderId: CYLINDER, kind: 'weighed', occurredAt: '2026-07-01T12:00:00-05:00', details: { gross: { unit: 'lb', value: 41.8 } } }

/** What is wrong with an event, as 'path: message'; nothing where it is sound. */
function faults(changes: Record<string, unknown>): string[] {
  const parsed = parseEvent({ ...sound, ...changes })
  return parsed.ok ? [] : parsed.errors.map(({ path, message }) => `${path}: ${message}`)
}

const gross = (reading: unknown) => faults({ details: { gross: reading } })

describe('an event as sent', () => {
  it('is read with its reading as entered, and a device left out', () => {
    expect(parseEvent(sound)).toEqual({ ok: true, event: { ...sound, deviceId: '', deviceSeq: 0 } })
  })

  it('may not say who acted, when it was recorded, nor anything else that is the server\'s', () => {
    for (const field of ['actorId', 'postedBy', 'recordedAt', 'seq', 'version', 'effectiveAt', 'trainee', 'hash']) {
      expect(faults({ [field]: 'x' })).toEqual([`${field}: is not a field that can be given here`])
    }
    expect(faults({ details: { gross: kg(1), net: 3 } })).toEqual(['details.net: is not a field that can be given here'])
  })

  it('has a time that exists, with its offset', () => {
    for (const time of ['2026-02-28T23:59:59Z', '2026-02-28T23:59+05:30', '2024-02-29T10:00:00.123-08:00']) expect(faults({ occurredAt: time }), time).toEqual([])
    for (const time of ['2026-02-29T10:00:00Z', '2026-02-28T10:00:00', '2026-02-28', '2026-02-28T25:00:00Z', 'yesterday', 1_782_925_200_000, null]) {
      expect(faults({ occurredAt: time }).map(text => text.split(':')[0]), String(time)).toEqual(['occurredAt'])
    }
  })

  it('may lie in the past and in the future', () => {
    expect(faults({ occurredAt: '2001-01-01T00:00:00Z' })).toEqual([])
    expect(faults({ occurredAt: '2101-01-01T00:00:00Z' })).toEqual([])
  })

  it('is of a known kind', () => {
    expect(faults({ kind: 'painted' })[0]).toMatch(/^kind: must be one of registered, /)
  })

  it('names each field that is missing', () => {
    expect(faults({ details: {} })).toEqual(['details.gross: is missing'])
    expect(faults({ details: undefined })).toEqual(['details: is missing'])
    expect(faults({ cylinderId: undefined, kind: 'moved', details: {} })).toEqual(['cylinderId: is missing', 'details.toPlaceId: is missing'])
  })

  it('has ids in lower case, whatever the sender wrote', () => {
    const parsed = parseEvent({ ...sound, id: sound.id.toUpperCase(), kind: 'moved', details: { toPlaceId: SHOP.toUpperCase() } })
    expect(parsed).toMatchObject({ ok: true, event: { id: sound.id, details: { toPlaceId: SHOP } } })
    expect(faults({ id: 'abc' })).toEqual(['id: must be an id (a UUID)'])
  })

  it('holds no text that a database would give back changed: that would break its chain', () => {
    for (const text of ['a\u0000b', 'half a pair \uD800', '\uDC00', 'a\nb']) {
      expect(faults({ deviceId: text }), JSON.stringify(text)).toEqual(['deviceId: must not hold control characters'])
      if (text !== 'a\nb') expect(faults({ note: text }), JSON.stringify(text)).toEqual(['note: must not hold control characters'])
    }
    expect(faults({ deviceId: 'van 3 \u{1F69A}', note: 'two\nlines \u{1F69A}' })).toEqual([])
  })

  it('that corrects one not known yet holds nothing that has no hash', () => {
    const corrected = (instead: unknown) => faults({ kind: 'corrected', details: { eventId: idOf(2), reason: 'misread', instead } })
    const nested = (depth: number): unknown => depth === 0 ? 1 : [nested(depth - 1)]
    expect(corrected({ gross: { unit: 'lb', value: 41.8 } })).toEqual([])
    expect(corrected({ gross: nested(7) })).toEqual([])
    for (const wrong of [{ gross: Infinity }, { gross: nested(8) }, JSON.parse(`{"gross":${'['.repeat(5000)}${']'.repeat(5000)}}`)]) {
      expect(corrected(wrong)).toEqual(['details.instead: must be the details of the event'])
    }
  })

  it('that is no object is refused without an id', () => {
    for (const raw of [null, 3, 'x', []]) expect(parseEvent(raw)).toMatchObject({ ok: false, id: null })
    expect(parseEvent({ id: 'mine' })).toMatchObject({ ok: false, id: 'mine' })
  })
})

describe('a mass as read', () => {
  it('may be nothing, but never negative, endless or beyond any scale', () => {
    expect(gross({ unit: 'lb', value: 0 })).toEqual([])
    for (const value of [-0.1, Number.NaN, Number.POSITIVE_INFINITY, 100_001]) expect(gross({ unit: 'lb', value }), String(value)).toHaveLength(1)
  })

  it('has whole pounds and less than sixteen ounces', () => {
    expect(gross({ unit: 'lb-oz', lb: 41, oz: 15.9 })).toEqual([])
    expect(gross({ unit: 'lb-oz', lb: 41, oz: 16 })).toEqual(['details.gross.oz: must be less than 16 oz'])
    expect(gross({ unit: 'lb-oz', lb: 41.5, oz: 0 })).toEqual(['details.gross.lb: must be whole pounds'])
  })

  it('has a unit that is known, and nothing beside', () => {
    expect(gross({ unit: 'stone', value: 3 })).toHaveLength(1)
    expect(gross({ unit: 'kg', value: 3, lb: 2 })).toEqual(['details.gross.lb: is not a field that can be given here'])
    expect(gross('41.8 lb')).toHaveLength(1)
  })
})

describe('a registration', () => {
  const registration = (stamp: object, more: object = {}) => faults({ kind: 'registered', details: { stamp: { ...STAMP, ...stamp }, ownership: 'own', ...more } })

  it('may leave unread what cannot be read', () => {
    expect(registration({ serial: null, servicePressurePsig: null, tareWeight: null, waterCapacity: null, madeMonth: null })).toEqual([])
  })

  it('has a specification of the list, without its pressure', () => {
    expect(registration({ spec: 'DOT-39' })).toEqual([])
    expect(registration({ spec: 'DOT-4BA400' })).toEqual(['details.stamp.spec: must be a specification without its pressure, such as "DOT-4BA"'])
    expect(registration({ spec: '__proto__' })).toHaveLength(1)
  })

  it('has no cylinder that weighs or holds nothing', () => {
    expect(registration({ waterCapacity: kg(0) })).toHaveLength(1)
    // Half a gram rounds to one; less rounds to none, and a density over no volume is no number.
    expect(registration({ waterCapacity: kg(0.0005) })).toEqual([])
    expect(registration({ waterCapacity: kg(0.0004) })).toHaveLength(1)
    expect(registration({ waterCapacity: kg(5e-324) })).toHaveLength(1)
    expect(registration({ tareWeight: kg(0) })).toHaveLength(1)
  })

  it('has marks with months and RINs that can be', () => {
    expect(registration({}, { marks: [{ month: '2024-12', rin: 'B123', suffix: 'E' }] })).toEqual([])
    expect(registration({}, { marks: [{ month: '2024-13' }] })).toHaveLength(1)
    expect(registration({}, { marks: [{ month: '2024-12', rin: '123' }] })).toHaveLength(1)
  })

  it('says what is in it in one of three ways', () => {
    for (const contents of ['evacuated', 'unknown', { refrigerant: 'R-1234ze(E)', condition: 'clean' }]) expect(registration({}, { contents })).toEqual([])
    for (const contents of ['empty', { refrigerant: 'R-22' }, { refrigerant: 'freon', condition: 'clean' }]) expect(registration({}, { contents })).not.toEqual([])
  })
})

describe('the other kinds', () => {
  it('receive and return at a place', () => {
    expect(faults({ kind: 'received', details: {} })).toEqual(['placeId: is missing: say where the cylinder is now'])
    expect(faults({ kind: 'received', placeId: SHOP, details: {} })).toEqual([])
    expect(faults({ kind: 'returned', details: { fromFirmId: SUPPLIER } })).toHaveLength(1)
  })

  it('exchange the one that comes at a place, the one that goes wherever it was', () => {
    const exchange = (direction: string) => ({ kind: 'exchanged', details: { direction, otherCylinderId: OTHER_CYLINDER, exchangeId: SHIPMENT, firmId: SUPPLIER } })
    expect(faults(exchange('in'))).toEqual(['placeId: is missing: say where the cylinder is now'])
    expect(faults({ ...exchange('in'), placeId: SHOP })).toEqual([])
    expect(faults(exchange('out'))).toEqual([])
  })

  it('label with a code whose check character is right', () => {
    expect(parseEvent({ ...sound, kind: 'labelled', details: { code: '7k3 m9q 2tx' } })).toMatchObject({ ok: true, event: { details: { code: '7K3M9Q2TX' } } })
    expect(faults({ kind: 'labelled', details: { code: '7K3M9Q2TY' } })).toHaveLength(1)
  })

  it('fill with a refrigerant, or with one that nobody knows', () => {
    expect(faults({ kind: 'filled', details: { refrigerant: null, grossAfter: kg(20) } })).toEqual([])
    expect(faults({ kind: 'filled', details: { grossAfter: kg(20) } })).toEqual(['details.refrigerant: is missing'])
    expect(faults({ kind: 'filled', details: { refrigerant: 'R-22', grossAfter: kg(20), looked: false } })).toHaveLength(1)
  })

  it('tell of the fill at most 200 readings, the purge, and the vacuum of the system with the minutes it held', () => {
    const filledWith = (more: object) => faults({ kind: 'filled', details: { refrigerant: 'R-22', grossAfter: kg(20), ...more } })
    const reading = { at: '2026-03-02T14:05:00-05:00', gross: kg(19) }
    expect(filledWith({ readings: Array(200).fill(reading), purged: true, reached: { vacuum: { inHg: 10 }, heldMinutes: 5 } })).toEqual([])
    expect(filledWith({ readings: Array(201).fill(reading) })).toEqual(['details.readings: must be at most 200 readings'])
    expect(filledWith({ readings: [{ ...reading, hoses: 'on' }] })).toHaveLength(1)
    expect(filledWith({ purged: false })).toHaveLength(1)
    expect(filledWith({ reached: { vacuum: { microns: 900 }, heldMinutes: 10_000 } })).toEqual([])
    expect(filledWith({ reached: { vacuum: { microns: 900 }, heldMinutes: 10_001 } })).toHaveLength(1)
    expect(filledWith({ reached: { heldMinutes: 5 } })).toHaveLength(1)
  })

  it('measure a vacuum in one way', () => {
    expect(faults({ kind: 'emptied', details: { vacuum: { inHg: 29.5, barometerInHg: 29.9 } } })).toEqual([])
    expect(faults({ kind: 'emptied', details: { vacuum: { microns: 500, inHg: 29 } } })).not.toEqual([])
    expect(faults({ kind: 'emptied', details: { vacuum: { microns: -1 } } })).toHaveLength(1)
  })
})

describe('the care of a cylinder', () => {
  it('is set apart and released for a reason', () => {
    for (const kind of ['quarantined', 'released']) {
      expect(faults({ kind, details: { reason: 'oil at the valve' } }), kind).toEqual([])
      expect(faults({ kind, details: { reason: 'x'.repeat(300) } }), kind).toEqual([])
      expect(faults({ kind, details: { reason: 'x'.repeat(301) } }), kind).toEqual(['details.reason: must be at most 300 characters'])
      expect(faults({ kind, details: { reason: '  ' } }), kind).toEqual(['details.reason: must not be empty'])
      expect(faults({ kind, details: {} }), kind).toEqual(['details.reason: is missing'])
    }
  })

  it('is looked over with a result, and with what was found only where something was', () => {
    expect(faults({ kind: 'inspected', details: { result: 'sound' } })).toEqual([])
    expect(faults({ kind: 'inspected', details: { result: 'damaged' } })).toEqual([])
    expect(faults({ kind: 'inspected', details: { result: 'damaged', reasons: ['dent', 'leak'] } })).toEqual([])
    expect(faults({ kind: 'inspected', details: { result: 'damaged', reasons: ['dent', 'dent'] } })).toEqual(['details.reasons: must name each once'])
    expect(faults({ kind: 'inspected', details: { result: 'damaged', reasons: [] } })).toEqual(['details.reasons: must name what was found'])
    expect(faults({ kind: 'inspected', details: { result: 'damaged', reasons: ['rust'] } })[0]).toMatch(/^details\.reasons\.0: must be one of dent, /)
    expect(faults({ kind: 'inspected', details: { result: 'sound', reasons: ['dent'] } })).toEqual(['details.reasons: is not a field that can be given here'])
    expect(faults({ kind: 'inspected', details: { result: 'fine' } })).toEqual(['details.result: must have a result: sound or damaged'])
  })

  it('is missed and found, with a place or without', () => {
    expect(faults({ kind: 'missing', details: {} })).toEqual([])
    expect(faults({ kind: 'missing', details: { lastSeen: 'on the roof' } })).toEqual([])
    expect(faults({ kind: 'found', details: {} })).toEqual([])
    expect(faults({ kind: 'found', details: { placeId: SHOP } })).toEqual([])
    expect(faults({ kind: 'found', details: { placeId: 'roof' } })).toEqual(['details.placeId: must be an id (a UUID)'])
  })

  it('ends with a reason, and with a proof that holds something where one is given', () => {
    const proof = (value: unknown) => faults({ kind: 'retired', details: { reason: 'scrapped', proof: value } })
    expect(faults({ kind: 'retired', details: { reason: 'scrapped' } })).toEqual([])
    expect(faults({ kind: 'retired', details: {} })).toEqual(['details.reason: is missing'])
    expect(proof({ certificate: 'S-114' })).toEqual([])
    expect(proof({ text: 'valve out,\nhole drilled' })).toEqual([])
    expect(proof({ photoIds: [idOf(7)] })).toEqual([])
    expect(proof({})).toEqual(['details.proof: must hold a text, a certificate or photos'])
    expect(proof({ photoIds: [] })).toEqual(['details.proof.photoIds: must name a photo'])
    expect(proof({ photoIds: Array.from({ length: 21 }, (_, index) => idOf(index)) })).toEqual(['details.proof.photoIds: must be at most 20 photos'])
    expect(proof({ certificate: 'two\nlines' })).toEqual(['details.proof.certificate: must not hold control characters'])
  })

  it('is countersigned by naming an entry', () => {
    expect(faults({ kind: 'countersigned', details: { eventId: idOf(3) } })).toEqual([])
    expect(faults({ kind: 'countersigned', details: { eventId: 3 } })).toEqual(['details.eventId: must be an id (a UUID)'])
    expect(faults({ kind: 'countersigned', details: {} })).toEqual(['details.eventId: is missing'])
  })
})
