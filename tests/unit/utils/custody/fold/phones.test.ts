import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { FOLD_CONTEXT, idOf, SHOP, START, TECHNICIAN, SUPERVISOR, VAN, VIEW_CONTEXT } from '~~/tests/helpers/custody'
import { detailsOf, placeOf, readPlainly, type Happening } from '~~/tests/helpers/plainCustody'
import type { AnyRecordedEvent } from '~~/utils/custody/event'
import { fold } from '~~/utils/custody/fold'
import { lifecycleOf } from '~~/utils/custody/lifecycle'
import { view } from '~~/utils/custody/view'

const MINUTE = 60_000
/** Nothing is sent before all of it has happened, so that no time is held back. */
const SENT_FROM = START + 2_000 * MINUTE
const CYLINDERS = ['0198f000-0000-7000-8000-0000000000c1', '0198f000-0000-7000-8000-0000000000c2']

/** A phone with a clock that runs ahead by so many seconds, and what it has not sent yet. */
interface Phone { id: string, skewSeconds: number, unsent: Happening[] }
interface Truth { happened: Happening[] }
interface Firm { phones: Phone[], log: AnyRecordedEvent[], deliveries: number }

/** Takes what a phone sends as the writer does: each id once, numbered by arrival, its time put right by the skew. */
function deliver(firm: Firm, { id: deviceId, skewSeconds }: Phone, happenings: readonly Happening[]): void {
  for (const one of happenings) {
    if (firm.log.some(({ id }) => id === one.id)) continue
    const recordedAt = SENT_FROM + ++firm.deliveries
    const occurredAt = START + one.minute * MINUTE + skewSeconds * 1000
    firm.log.push({
      seq: firm.deliveries, id: one.id, cylinderId: one.cylinder, version: firm.log.filter(({ cylinderId }) => cylinderId === one.cylinder).length + 1, kind: one.kind,
      occurredAt, occurredOffsetMinutes: 0, clockSkewSeconds: skewSeconds, effectiveAt: Math.min(occurredAt - skewSeconds * 1000, recordedAt), recordedAt,
      deviceId, deviceSeq: 0, actorId: TECHNICIAN, postedBy: TECHNICIAN, supervisorId: null, trainee: false, placeId: placeOf(one), note: null, practice: false, confirmed: [],
      details: detailsOf(one),
    } as AnyRecordedEvent)
  }
}

/** Every cylinder of the log is what a plain reading of all that was delivered says. */
function compare(firm: Firm, happened: readonly Happening[]): void {
  for (const cylinder of CYLINDERS) {
    const events = firm.log.filter(({ cylinderId }) => cylinderId === cylinder)
    const { state, movements } = fold(events, FOLD_CONTEXT)
    const { netGrams, refrigerant, condition, inStock } = state.contents
    const known = new Set(events.map(({ id }) => id))
    expect({ netGrams, refrigerant, condition, placeId: state.placeId, holderId: state.holderId, lifecycle: lifecycleOf(state) })
      .toEqual(readPlainly(happened.filter(({ id }) => known.has(id))))
    expect(movements.reduce((sum, { grams }) => sum + grams, 0)).toBe(inStock ? netGrams ?? 0 : 0)
    expect(netGrams ?? 0).toBeGreaterThanOrEqual(0)
    const { capacity, findings } = view(state, VIEW_CONTEXT)
    if ((capacity.roomGrams ?? 0) < 0) expect(findings.map(({ code }) => code)).toContain('overfill')
  }
}

class Happens implements fc.Command<Truth, Firm> {
  constructor(readonly what: object, readonly where: { cylinder: number, phone: number }, readonly target: number) {}
  check = () => true
  run(truth: Truth, firm: Firm): void {
    const earlier = truth.happened.filter(({ cylinder }) => cylinder === CYLINDERS[this.where.cylinder])
    const one = { ...this.what, id: idOf(truth.happened.length), cylinder: CYLINDERS[this.where.cylinder]! } as Happening
    // Two events never share an instant here: what then decides is held elsewhere.
    one.minute = one.minute * 100 + truth.happened.length
    if (one.kind === 'corrected') {
      if (earlier.length === 0) return
      one.eventId = earlier[this.target % earlier.length]!.id
    }
    truth.happened.push(one)
    firm.phones[this.where.phone]!.unsent.push(one)
  }

  toString = () => JSON.stringify([this.what, this.where, this.target])
}

class Sends implements fc.Command<Truth, Firm> {
  constructor(readonly phone: number, readonly keys: number[], readonly sendsTwice: boolean) {}
  check = () => true
  run(truth: Truth, firm: Firm): void {
    const phone = firm.phones[this.phone]!
    const shuffled = phone.unsent.map((one, index) => ({ one, key: this.keys[index % this.keys.length]! * (index + 1) % 97 })).sort((a, b) => a.key - b.key).map(({ one }) => one)
    deliver(firm, phone, shuffled)
    if (this.sendsTwice) deliver(firm, phone, [...shuffled].reverse())
    phone.unsent = []
    compare(firm, truth.happened)
  }

  toString = () => `sends ${this.phone}`
}

const minute = fc.integer({ min: 0, max: 15 })
const gross = fc.constantFrom(12_000, 13_000, 15_500, 20_000, 29_500)
const full = fc.constantFrom(13_000, 15_500, 20_000, 29_500)
const place = fc.constantFrom(SHOP, VAN)
const what: fc.Arbitrary<object> = fc.oneof(
  { weight: 2, arbitrary: fc.record({ kind: fc.constant('registered'), minute }) },
  fc.record({ kind: fc.constant('moved'), minute, placeId: place, holderId: fc.constantFrom(undefined, TECHNICIAN) }),
  fc.record({ kind: fc.constant('handed-over'), minute, holderId: fc.constantFrom(TECHNICIAN, SUPERVISOR) }),
  { weight: 5, arbitrary: fc.record({ kind: fc.constant('weighed'), minute, gross }) },
  fc.record({ kind: fc.constant('drawn'), minute, gross: full }),
  { weight: 3, arbitrary: fc.record({ kind: fc.constant('filled'), minute, name: fc.constantFrom('R-22', 'R-410A'), condition: fc.constantFrom(undefined, 'clean', 'suspect'), gross: full }) },
  fc.record({ kind: fc.constant('emptied'), minute, deep: fc.boolean() }),
  ...['lost', 'quarantined', 'released', 'missing', 'reclaimed', 'sent-for-test', 'retired'].map(kind => fc.record({ kind: fc.constant(kind), minute })),
  fc.record({ kind: fc.constant('found'), minute, placeId: fc.constantFrom(undefined, SHOP, VAN) }),
  { weight: 4, arbitrary: fc.record({ kind: fc.constant('received'), minute, gross: fc.option(gross, { nil: undefined }) }) },
  { weight: 4, arbitrary: fc.record({ kind: fc.constant('sent-for-reclaim'), minute, gross: full }) },
  fc.record({ kind: fc.constant('retested'), minute, result: fc.constantFrom('passed', 'passed', 'rejected', 'condemned'), wet: fc.boolean() }),
  { weight: 9, arbitrary: fc.record({ kind: fc.constant('corrected'), minute, eventId: fc.constant(''), gross: fc.option(full, { nil: undefined }) }) },
)
const happens = fc.tuple(what, fc.record({ cylinder: fc.nat(1), phone: fc.nat(2) }), fc.nat(50)).map(([one, where, target]) => new Happens(one, where, target))
const sends = fc.tuple(fc.nat(2), fc.array(fc.integer({ min: 1, max: 96 }), { minLength: 1, maxLength: 8 }), fc.boolean()).map(([phone, keys, twice]) => new Sends(phone, keys, twice))

describe('three phones with clocks of their own, two cylinders, late and doubled deliveries, and corrections', () => {
  it('leave every cylinder as a plain reading of what was delivered says, and in the end in any order of arrival', () => {
    fc.assert(fc.property(
      fc.commands([happens, happens, happens, sends], { maxCommands: 100, size: 'max' }),
      fc.array(fc.oneof(fc.constant(0), fc.integer({ min: 60, max: 200_000 }), fc.integer({ min: -200_000, max: -60 })), { minLength: 3, maxLength: 3 }),
      (commands, skews) => {
        const firm: Firm = { phones: skews.map((skewSeconds, index) => ({ id: `phone-${index}`, skewSeconds, unsent: [] })), log: [], deliveries: 0 }
        const truth: Truth = { happened: [] }
        fc.modelRun(() => ({ model: truth, real: firm }), commands)
        for (const phone of firm.phones) deliver(firm, phone, phone.unsent)
        compare(firm, truth.happened)
        const backwards = [...firm.log].reverse()
        for (const cylinder of CYLINDERS) {
          const mine = (events: AnyRecordedEvent[]) => fold(events.filter(({ cylinderId }) => cylinderId === cylinder), FOLD_CONTEXT)
          expect(mine(backwards)).toEqual(mine(firm.log))
        }
      },
    ), { numRuns: 80 })
  }, 60_000)
})
