import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { corrected, CUSTOMER, did, filled, FOLD_CONTEXT, folded, HOUR, idOf, kg, recorded, registered, START, SUPPLIER, weighed, type Told } from '~~/tests/helpers/custody'
import { anyStory } from '~~/tests/helpers/custodyArbitraries'
import type { BalanceAccount } from '~~/utils/contract/massBalance'
import { fold } from '~~/utils/custody/fold'
import { heldIn } from '~~/utils/custody/fold/stock'
import { MOVEMENT_CAUSES, type Movement } from '~~/utils/custody/movement'
import type { StockChange } from '~~/utils/custody/stockChange'
import { bookSums, stockSums, type Span } from '~~/utils/records/books'
import { massBalances, type OwnersBalance } from '~~/utils/records/massBalance'
import { spanOf } from '~~/utils/records/period'

const ALWAYS: Span = { fromMs: 0, untilMs: Number.MAX_SAFE_INTEGER }
const hour = (count: number) => START + count * HOUR
const from = (fromHour: number, untilHour: number): Span => ({ fromMs: hour(fromHour), untilMs: hour(untilHour) })

interface Books { movements: Movement[], stockChanges: StockChange[] }

function balanceOf({ movements, stockChanges }: Books, span: Span): OwnersBalance[] {
  return massBalances(bookSums(movements, span), stockSums(stockChanges, span))
}

/** The books of several cylinders as one. */
function together(...stories: Told[][]): Books {
  const folds = stories.map(story => folded(...story))
  return { movements: folds.flatMap(one => one.movements), stockChanges: folds.flatMap(one => one.stockChanges) }
}

/** An account as a line of figures: opening, each cause that moved, apart where there is any, closing. */
function line({ openingGrams, causes, apart, closingGrams }: BalanceAccount): string {
  return [
    openingGrams, ...causes.filter(({ movements }) => movements > 0).map(({ cause, grams }) => `${cause} ${grams}`),
    ...(apart.movements > 0 ? [`apart ${apart.grams}`] : []), closingGrams,
  ].join(', ')
}

describe('the balance of a refrigerant', () => {
  // Tare 12 kg. 8 kg recovered, 2 kg drawn back, 0.1 kg sampled, half a kilogram lost, then 0.4 kg less than the log says.
  const year = [
    registered(), filled('R-22', 20), did('drawn', { grossAfter: kg(18), purpose: 'same-system' }),
    did('drawn', { grossAfter: kg(17.9), purpose: 'sampling' }), did('lost', { grossAfter: kg(17.4), cause: 'hose' }), weighed(17),
  ]

  it('is opening plus every cause, which makes closing', () => {
    const [balance] = balanceOf(folded(...year), ALWAYS)
    expect(balance?.refrigerant).toBe('R-22')
    expect(line(balance!.account)).toBe('0, recovered 8000, drawn-same-system -2000, sampled -100, lost -500, weighing -400, 5000')
  })

  it('names every cause of the closed list once, moved or not', () => {
    const [balance] = balanceOf(folded(...year), ALWAYS)
    expect(balance!.account.causes.map(({ cause }) => cause)).toEqual([...MOVEMENT_CAUSES])
  })

  it('opens with what was in it before, and leaves out what comes after', () => {
    // From the draw on, until before the loss.
    expect(line(balanceOf(folded(...year), from(2, 4))[0]!.account)).toBe('8000, drawn-same-system -2000, sampled -100, 5900')
  })

  it('counts an event at the first instant of the period in, and one at the first instant after it out', () => {
    expect(line(balanceOf(folded(...year), { fromMs: hour(2), untilMs: hour(3) })[0]!.account)).toBe('8000, drawn-same-system -2000, 6000')
    expect(line(balanceOf(folded(...year), { fromMs: hour(2) + 1, untilMs: hour(3) + 1 })[0]!.account)).toBe('6000, sampled -100, 5900')
  })

  it('agrees with what the cylinder holds, at both ends', () => {
    const { stock, agrees } = balanceOf(folded(...year), from(2, 4))[0]!.account
    expect([stock.opening.grams, stock.closing.grams, agrees]).toEqual([8000, 5900, true])
  })

  it('says so where the books have lost a movement', () => {
    const { movements, stockChanges } = folded(...year)
    const { account } = balanceOf({ movements: movements.filter(({ cause }) => cause !== 'sampled'), stockChanges }, ALWAYS)[0]!
    expect([account.closingGrams, account.stock.closing.grams, account.agrees]).toEqual([5100, 5000, false])
  })

  it('gives what enters from a weight that was not known a line of its own, beside the opening', () => {
    const story = [registered({ contents: { refrigerant: 'R-22', condition: 'clean' } }), weighed(15), filled('R-22', 18)]
    expect(line(balanceOf(folded(...story), ALWAYS)[0]!.account)).toBe('0, opening 3000, recovered 3000, 6000')
  })

  it('counts cylinders that nobody has weighed beside the sum, never as nothing', () => {
    const notWeighed = [registered({ contents: { refrigerant: 'R-22', condition: 'clean' } })]
    const { account } = balanceOf(together(year, notWeighed), ALWAYS)[0]!
    expect(account.stock).toMatchObject({ opening: { notKnown: 0 }, closing: { grams: 5000, notKnown: 1 } })
    expect(balanceOf(together(notWeighed), ALWAYS).map(({ refrigerant, account: alone }) => [refrigerant, alone.closingGrams, alone.stock.closing.notKnown])).toEqual([['R-22', 0, 1]])
  })

  it('has no account for what there was nothing of', () => {
    expect(balanceOf(folded(registered()), ALWAYS)).toEqual([])
  })

  it('keeps owners apart, and has everybody\'s sum', () => {
    // Ours 2 kg, the customer's 6 kg; 2 kg drawn for another purpose goes by share.
    const story = [registered(), filled('R-22', 14), filled('R-22', 20, { ownerOfRefrigerantId: CUSTOMER }), did('drawn', { grossAfter: kg(18), purpose: 'other' })]
    const [balance] = balanceOf(folded(...story), ALWAYS)
    expect(balance!.owners.map(({ ownerId, account }) => [ownerId, line(account)])).toEqual([
      [null, '0, recovered 2000, drawn-other -500, 1500'],
      [CUSTOMER, '0, recovered 6000, drawn-other -1500, 4500'],
    ])
    expect(line(balance!.account)).toBe('0, recovered 8000, drawn-other -2000, 6000')
  })

  it('takes what is renamed out of one refrigerant and into the other, the unnamed last', () => {
    const other = [registered(), filled('R-22', 20), did('checked', { method: 'identifier', verdict: { refrigerant: 'R-410A', condition: 'clean' } })]
    const mixed = [registered(), filled('R-22', 16), filled('R-134a', 17)]
    expect(balanceOf(together(other, mixed), ALWAYS).map(({ refrigerant, account }) => [refrigerant, line(account)])).toEqual([
      ['R-134a', '0, recovered 1000, renamed -1000, 0'],
      ['R-22', '0, recovered 12000, renamed -12000, 0'],
      ['R-410A', '0, renamed 8000, 8000'],
      [null, '0, renamed 5000, 5000'],
    ])
  })

  it('has what went to a reclaimer and what came back with a firm', () => {
    const story = [
      registered(), filled('R-22', 20), did('sent-for-reclaim', { shipmentId: idOf(50), gross: kg(20) }, { placeId: idOf(51) }),
    ]
    const back = [registered(), filled('R-22', 20), did('returned', { gross: kg(21), fromFirmId: SUPPLIER })]
    expect(line(balanceOf(together(story, back), ALWAYS)[0]!.account)).toBe('0, recovered 16000, returned-with 1000, shipped -8000, 9000')
  })

  it('keeps practice and what is not signed in a line of its own inside the sum', () => {
    const story = [registered(), filled('R-22', 20), did('drawn', { grossAfter: kg(19), purpose: 'other' }, { practice: true }), weighed(18, { trainee: true })]
    const { account } = balanceOf(folded(...story), ALWAYS)[0]!
    expect(line(account)).toBe('0, recovered 8000, apart -2000, 6000')
    expect([account.apart.movements, account.unexplained.grams, account.agrees]).toEqual([2, 0, true])
  })

  it('follows a correction that moves the amount, in the month of the event and not of the correction', () => {
    const march = spanOf({ from: '2026-03-01', to: '2026-03-31' }, 'America/Chicago')
    const april = spanOf({ from: '2026-04-01', to: '2026-04-30' }, 'America/Chicago')
    const at = (iso: string) => ({ occurredAt: Date.parse(iso), recordedAt: Date.parse('2026-05-02T12:00:00Z') })
    const story = [
      registered({}, at('2026-03-02T12:00:00-06:00')), filled('R-22', 20, {}, at('2026-03-20T12:00:00-05:00')), weighed(19, at('2026-04-10T12:00:00-05:00')),
    ]
    expect(line(balanceOf(folded(...story), march)[0]!.account)).toBe('0, recovered 8000, 8000')
    expect(line(balanceOf(folded(...story), april)[0]!.account)).toBe('8000, weighing -1000, 7000')
    const fixed = corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(19), looked: true }, at('2026-05-01T12:00:00-05:00'))
    expect(line(balanceOf(folded(...story, fixed), march)[0]!.account)).toBe('0, recovered 7000, 7000')
    expect(line(balanceOf(folded(...story, fixed), april)[0]!.account)).toBe('7000, 7000')
  })

  it('puts a fill that was taken out and entered with its true time into the month of that time', () => {
    const march = spanOf({ from: '2026-03-01', to: '2026-03-31' }, 'America/Chicago')
    const at = (iso: string) => ({ occurredAt: Date.parse(iso), recordedAt: Date.parse('2026-05-02T12:00:00Z') })
    const late = filled('R-22', 20, {}, at('2026-04-01T00:30:00-05:00'))
    const story = [registered({}, at('2026-03-02T12:00:00-06:00')), late]
    expect(balanceOf(folded(...story), march)).toEqual([])
    const mended = [...story, corrected(idOf(1), undefined, at('2026-04-02T12:00:00-05:00')), filled('R-22', 20, {}, at('2026-03-31T23:30:00-05:00'))]
    expect(line(balanceOf(folded(...mended), march)[0]!.account)).toBe('0, recovered 8000, 8000')
  })
})

describe('what no cause explains', () => {
  // At 20 kg the default scale is good to 100 g; at 20.20 kg to 101, at 20.21 to 102, at 19.81 to 100 and at 19.80 to 99 g.
  it.each([
    [20.2, 200, false],
    [20.21, 210, true],
    [19.81, -190, false],
    [19.8, -200, true],
  ])('weighed again at %s kg is %s g: more than two scales tell apart? %s', (gross, grams, isMore) => {
    const { unexplained } = balanceOf(folded(registered(), filled('R-22', 20), weighed(gross)), ALWAYS)[0]!.account
    expect([unexplained.grams, unexplained.isMore]).toEqual([grams, isMore])
  })

  it('is as unsure as the root of the sum of the squares of the differences', () => {
    // Three cylinders, each two readings at 20 kg: 200 g each; root(3 x 200 x 200) = 346.4, up to 347 g.
    const one = [registered(), filled('R-22', 20), weighed(20)]
    const { unexplained } = balanceOf(together(one, one, one), ALWAYS)[0]!.account
    expect(unexplained).toEqual({ grams: 0, uncertaintyGrams: 347, isMore: false })
  })

  it('is not made less sure by cylinders that nobody touched in the period', () => {
    const rested = [registered(), filled('R-22', 20)]
    const books = together([...rested, weighed(19.9)], rested, rested)
    const { unexplained, stock } = balanceOf(books, from(2, 3))[0]!.account
    // The one that was weighed: 100 g and 19.9 kg x 0.5 % = 99.5, up to 100 g.
    expect(unexplained).toEqual({ grams: -100, uncertaintyGrams: 200, isMore: false })
    // What the three hold rests on three readings of 100 g: 173.2, up to 174 g.
    expect(stock.closing).toEqual({ grams: 23_900, uncertaintyGrams: 174, notKnown: 0 })
  })

  it('is the scale\'s own accuracy where the scale has one', () => {
    const scale = { id: idOf(60), name: 'Bench', accuracyGrams: 10, accuracyPercent: 0, lastCheck: null }
    const story = [registered(), filled('R-22', 20, { scaleId: scale.id }), did('weighed', { gross: kg(19.97), scaleId: scale.id })]
    const books = fold(recorded(...story), { ...FOLD_CONTEXT, scales: new Map([[scale.id, scale]]) })
    expect(balanceOf(books, ALWAYS)[0]!.account.unexplained).toEqual({ grams: -30, uncertaintyGrams: 20, isMore: true })
  })

  it('is also what a new tare changes', () => {
    const retest = did('retested', { month: '2026-07', requalifierId: idOf(61), method: 'visual', result: 'passed', newTare: kg(11.9) })
    const { account } = balanceOf(folded(registered(), filled('R-22', 20), retest), ALWAYS)[0]!
    expect(line(account)).toBe('0, recovered 8000, tare-change 100, 8100')
    expect(account.unexplained).toEqual({ grams: 100, uncertaintyGrams: 100, isMore: false })
  })

  it('is no surer where two own it: the parts of one reading err alike', () => {
    // Ours 2 kg, the customer's 6 kg of what 20 kg gross told; at 18 kg (100 + 90) g: 47.5, up to 48, and 142.5, up to 143 g.
    const two = [registered(), filled('R-22', 14), filled('R-22', 20, { ownerOfRefrigerantId: CUSTOMER }), weighed(18)]
    const [balance] = balanceOf(folded(...two), ALWAYS)
    expect(balance!.owners.map(({ account }) => account.unexplained.uncertaintyGrams)).toEqual([48, 143])
    expect(balance!.account.unexplained).toEqual({ grams: -2000, uncertaintyGrams: 191, isMore: true })
    // The net rests on 90 g: 22.5, up to 23, and 67.5, up to 68 g.
    expect(balance!.owners.map(({ account }) => account.stock.closing.uncertaintyGrams)).toEqual([23, 68])
    expect(balance!.account.stock.closing.uncertaintyGrams).toBe(91)
    // Two such cylinders err each by itself: root(2 x 191 x 191) = 270.1.
    expect(balanceOf(together(two, two), ALWAYS)[0]!.account.unexplained.uncertaintyGrams).toBe(271)
  })

  it('asked for one owner is that owner\'s alone', () => {
    const two = folded(registered(), filled('R-22', 14), filled('R-22', 20, { ownerOfRefrigerantId: CUSTOMER }), weighed(18))
    const theirs = { movements: two.movements.filter(({ ownerId }) => ownerId === CUSTOMER), stockChanges: two.stockChanges.filter(({ ownerId }) => ownerId === CUSTOMER) }
    expect(balanceOf(theirs, ALWAYS)[0]!.account.unexplained.uncertaintyGrams).toBe(143)
  })
})

describe('for any fleet and any span', () => {
  const fleets = fc.array(anyStory, { minLength: 1, maxLength: 4 })
  const spans = fc.tuple(fc.integer({ min: -1, max: 8 }), fc.integer({ min: 0, max: 9 })).map(([begin, length]) => from(begin, begin + length))

  it('closes to the gram and agrees with what the cylinders hold at both ends', () => {
    fc.assert(fc.property(fleets, spans, (stories, span) => {
      const books = together(...stories)
      for (const { account, owners } of balanceOf(books, span)) {
        for (const each of [account, ...owners.map(owner => owner.account)]) {
          const moved = each.causes.reduce((sum, { grams }) => sum + grams, 0) + each.apart.grams
          expect(each.openingGrams + moved).toBe(each.closingGrams)
          expect(each.agrees).toBe(true)
        }
        expect(owners.reduce((sum, owner) => sum + owner.account.closingGrams, 0)).toBe(account.closingGrams)
      }
    }), { numRuns: 200 })
  })

  it('closes with what the cylinders hold once all has happened', () => {
    fc.assert(fc.property(fleets, (stories) => {
      const held: Record<string, number> = {}
      for (const story of stories) {
        for (const { refrigerant, grams } of heldIn(folded(...story).state)) held[String(refrigerant)] = (held[String(refrigerant)] ?? 0) + grams
      }
      const closing = balanceOf(together(...stories), ALWAYS).map(({ refrigerant, account }) => [String(refrigerant), account.closingGrams] as const)
      const known = (all: readonly (readonly [string, number])[]) => Object.fromEntries(all.filter(([, grams]) => grams !== 0))
      expect(known(closing)).toEqual(known(Object.entries(held)))
    }), { numRuns: 200 })
  })

  it('opens where the period before it closed', () => {
    fc.assert(fc.property(fleets, fc.integer({ min: -1, max: 8 }), (stories, hours) => {
      const books = together(...stories)
      const before = new Map(balanceOf(books, from(-2, hours)).map(({ refrigerant, account }) => [refrigerant, account.closingGrams]))
      for (const { refrigerant, account } of balanceOf(books, from(hours, 9))) expect(account.openingGrams).toBe(before.get(refrigerant) ?? 0)
    }), { numRuns: 100 })
  })
})
