import { describe, expect, it } from 'vitest'
import { codes, CUSTOMER, DAY, did, filled, folded, kg, LOT, registered, SHIPMENT, STAMP, START, viewAfter, VIEW_CONTEXT, weighed } from '~~/tests/helpers/custody'
import { view } from '~~/utils/custody/view'

const MANAGER = { personId: 'm', roles: ['manager' as const], trainee: false }

describe('the capacity of a cylinder', () => {
  it('with nothing in it is that of the refrigerant it is kept for, else of the one asked about', () => {
    expect(viewAfter([registered()]).capacity).toMatchObject({ forRefrigerant: null, fillLimitGrams: null, stopWeightGrams: null, missing: ['refrigerant'] })
    expect(viewAfter([registered()], { askedRefrigerant: 'R-22' }).capacity).toMatchObject({ forRefrigerant: 'R-22', stopWeightGrams: 28_000, roomGrams: 16_000 })
    expect(viewAfter([registered({ dedicatedTo: 'R-134a' })], { askedRefrigerant: 'R-22' }).capacity.forRefrigerant).toBe('R-134a')
  })

  it('with something in it is that of what is in it, whatever was asked', () => {
    const kept = registered({ dedicatedTo: 'R-134a' })
    expect(viewAfter([kept, filled('R-22', 20)], { askedRefrigerant: 'R-410A' }).capacity.forRefrigerant).toBe('R-22')
    expect(viewAfter([kept, weighed(13)], { askedRefrigerant: 'R-410A' }).capacity).toMatchObject({ forRefrigerant: null, stopWeightGrams: null })
  })

  it('not weighed has a stop weight but no room', () => {
    const shown = viewAfter([registered({ contents: { refrigerant: 'R-22', condition: 'clean' } })])
    expect(shown.capacity).toMatchObject({ stopWeightGrams: 28_000, roomGrams: null, missing: ['weight'] })
    expect(codes(shown)).toEqual(['weight-not-known'])
  })

  it('has no number without its water capacity, its service pressure or a refrigerant the catalogue knows', () => {
    const holding = (stamp: object, refrigerant = 'R-22') => viewAfter([registered({ stamp: { ...STAMP, ...stamp }, contents: { refrigerant, condition: 'clean' }, gross: kg(15) })]).capacity
    expect(holding({ waterCapacity: null })).toMatchObject({ stopWeightGrams: null, roomGrams: null, missing: ['waterCapacity'] })
    expect(holding({ servicePressurePsig: null })).toMatchObject({ stopWeightGrams: null, roomGrams: null, missing: ['servicePressure'] })
    expect(holding({}, 'R-9999')).toMatchObject({ stopWeightGrams: null, roomGrams: null, missing: ['refrigerant'] })
  })

  it('is shown as a limit, but without a stop weight, while the cylinder does not suit the refrigerant', () => {
    const shown = viewAfter([registered({ stamp: { ...STAMP, flammableMarked: false } })], { askedRefrigerant: 'R-454B' })
    expect(shown.capacity.refusals.map(({ code }) => code)).toEqual(['not-marked-flammable'])
    expect(shown.capacity.fillLimitGrams).toBeGreaterThan(0)
    expect(shown.capacity).toMatchObject({ stopWeightGrams: null, roomGrams: null })
    // Nothing of it is in the cylinder, so it is no finding of the cylinder.
    expect(codes(shown)).toEqual([])
  })

  it('tells when it would be liquid-full: of its net, and of its limit where nothing is in it', () => {
    const at = (grossKg: number) => viewAfter([registered(), filled('R-22', grossKg)]).capacity.liquidFull
    // 8 kg in 20.02 L are 0.4 kg/L, thinner than any liquid of the table, which ends at 70 C.
    expect(at(20)).toEqual({ aboveC: 70 })
    // 21.164 kg in 20.0192 L are 1.0572 kg/L, the liquid at 55 C.
    expect(at(33.164)).toMatchObject({ c: expect.closeTo(55, 1) as number })
    expect(viewAfter([registered()], { askedRefrigerant: 'R-22' }).capacity.liquidFull).toEqual({ aboveC: 70 })
    expect(viewAfter([registered(), filled('R-22', 17), filled('R-134a', 20)]).capacity.liquidFull).toBeNull()
  })

  it('shows the firm\'s share and stops by it', () => {
    const policyNow = { shareThousandths: 700, ceilingThousandths: 950, options: { liquid130F: false, unRatio: false } }
    expect(viewAfter([registered()], { policyNow, askedRefrigerant: 'R-22' }).capacity).toMatchObject({ share: 0.7, fillLimitGrams: 14_000, stopWeightGrams: 26_000 })
  })
})

describe('the retest of a cylinder', () => {
  // Made March 2024, five years: due March 2029, in Chicago through the last instant of 31 March (UTC-5).
  const lastInstant = Date.UTC(2029, 3, 1, 5) - 1
  const on = (nowMs: number, contents: 'evacuated' | { refrigerant: string, condition: 'clean' } = 'evacuated') => viewAfter(
    [registered({ contents, ...(contents === 'evacuated' ? {} : { gross: kg(15) }) }, { occurredAt: nowMs - DAY })], { nowMs, askedRefrigerant: 'R-22' },
  )

  it('is in date through the last day of the due month, in the firm\'s zone', () => {
    expect(on(lastInstant)).toMatchObject({ requalification: { state: 'due-soon', dueMonth: '2029-03' }, capacity: { stopWeightGrams: 28_000 } })
    expect(on(lastInstant + 1)).toMatchObject({ requalification: { state: 'overdue' }, capacity: { stopWeightGrams: null, roomGrams: null } })
  })

  it('overdue is a stop with nothing in it and a caution with contents, but always a stop for a fill', () => {
    const holding = { refrigerant: 'R-22', condition: 'clean' as const }
    expect(on(lastInstant + 1).findings).toMatchObject([{ code: 'retest-overdue', severity: 'stop' }])
    expect(on(lastInstant + 1, holding).findings).toMatchObject([{ code: 'retest-overdue', severity: 'caution' }])
    expect(on(lastInstant + 1, holding).capacity).toMatchObject({ stopWeightGrams: null, refusals: [{ code: 'retest-overdue', severity: 'stop' }] })
  })

  it('is spoken of 120 days ahead of the due month\'s last day', () => {
    // 120 days before 31 March 2029 is 1 December 2028.
    expect(codes(on(Date.UTC(2028, 10, 30, 18)))).toEqual([])
    expect(codes(on(Date.UTC(2028, 11, 1, 18)))).toEqual(['retest-soon'])
  })

  it('is not required of a DOT-39', () => {
    expect(viewAfter([registered({ stamp: { ...STAMP, spec: 'DOT-39' } })]).requalification).toMatchObject({ state: 'not-required', dueMonth: null })
  })

  it('without any date is a stop', () => {
    const shown = viewAfter([registered({ stamp: { ...STAMP, madeMonth: null } })], { askedRefrigerant: 'R-22' })
    expect(codes(shown)).toEqual(['retest-unknown'])
    expect(shown.capacity).toMatchObject({ stopWeightGrams: null, missing: ['testDate'] })
  })
})

describe('a cylinder that nobody has seen', () => {
  const after = (days: number, ...more: Parameters<typeof folded>) => viewAfter([registered(), ...more], { nowMs: START + days * DAY })

  it('is to be looked for after 30 days, and asked after as missing after 90', () => {
    expect(codes(after(29))).toEqual([])
    expect(codes(after(30))).toEqual(['not-seen'])
    expect(after(89).findings[0]?.text).not.toContain('Missing?')
    expect(after(90).findings[0]?.text).toContain('Missing?')
  })

  it('is not seen by a label, and not looked for where it is away', () => {
    expect(codes(after(30, did('labelled', { code: '7K3M9Q2TX' }, { occurredAt: START + 20 * DAY })))).toEqual(['not-seen'])
    expect(codes(after(30, weighed(12, { occurredAt: START + 20 * DAY })))).toEqual([])
    expect(codes(after(400, did('sent-for-test', { lotId: LOT })))).toEqual([])
    expect(codes(after(400, did('sent-for-reclaim', { shipmentId: SHIPMENT, gross: kg(12) })))).toEqual([])
  })
})

describe('what somebody may do', () => {
  it('holds every kind once, as allowed or not, for who may record at all', () => {
    const { may, mayNot } = viewAfter([registered(), filled('R-22', 20)])
    expect(may).toEqual(['labelled', 'received', 'moved', 'handed-over', 'weighed', 'filled', 'drawn', 'transferred', 'checked', 'emptied', 'lost', 'inspected', 'quarantined', 'missing', 'returned', 'exchanged'])
    expect(mayNot.map(({ kind }) => kind)).toEqual(['registered', 'released', 'found', 'retired', 'sent-for-reclaim', 'reclaimed', 'sent-for-test', 'retested', 'corrected', 'countersigned'])
  })

  it('is nothing for an auditor and for nobody', () => {
    for (const access of [null, { personId: 'a', roles: ['auditor' as const], trainee: false }]) {
      expect(viewAfter([registered()], { access })).toMatchObject({ may: [], mayNot: [] })
    }
  })

  it('never sends a cylinder off without its papers, not even for a manager', () => {
    const { may } = viewAfter([registered(), filled('R-22', 20)], { access: MANAGER })
    expect(may).toContain('retested')
    expect(may).not.toContain('sent-for-reclaim')
    expect(may).not.toContain('sent-for-test')
  })

  it('says why a cylinder is not to be filled', () => {
    const why = (...story: Parameters<typeof folded>) => viewAfter(story).mayNot.find(({ kind }) => kind === 'filled')?.because
    expect(why(registered())).toContain('refrigerant')
    expect(why(registered(), filled('R-22', 17), filled('R-134a', 18))).toContain('More than one refrigerant')
    expect(why(registered(), filled('R-22', 29))).toContain('Overfilled')
    expect(why(registered(), filled('R-22', 20))).toBeUndefined()
  })
})

describe('a view', () => {
  it('names places, people and owners, and the firm by nobody', () => {
    const shown = viewAfter([registered({ ownership: 'customer', ownerId: CUSTOMER }), did('handed-over', { toHolderId: VIEW_CONTEXT.access!.personId })])
    expect(shown).toMatchObject({ place: { name: 'place a1' }, holder: { name: 'person b1' }, owner: { name: 'firm f1' } })
    expect(viewAfter([registered()]).owner).toBeNull()
  })

  it('shows a state that was kept as JSON the same', () => {
    const { state } = folded(registered(), filled('R-22', 20))
    expect(view(JSON.parse(JSON.stringify(state)) as typeof state, VIEW_CONTEXT)).toEqual(view(state, VIEW_CONTEXT))
  })
})
