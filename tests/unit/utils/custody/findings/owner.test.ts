import { describe, expect, it } from 'vitest'
import { CUSTOMER, did, filled, kg, lastFindings, OTHER_CYLINDER, registered, SUPPLIER, viewAfter } from '~~/tests/helpers/custody'
import { mayDraw, mayGiveAway } from '~~/utils/custody/plan'
import type { DetailsOf } from '~~/utils/custody/schema'

const ANOTHER = '0198f000-0000-7000-8000-0000000000f9'

const ours = [registered(), filled('R-22', 20)]
const theirs = [registered(), filled('R-22', 20, { ownerOfRefrigerantId: CUSTOMER })]
const ofTwo = [...ours, filled('R-22', 21, { ownerOfRefrigerantId: CUSTOMER })]
const drawn = (details: Partial<DetailsOf<'drawn'>>) => did('drawn', { grossAfter: kg(18), purpose: 'same-system', ...details })
const out = (ownerOfRefrigerantId?: string) => did('transferred', {
  direction: 'out', counterpartId: OTHER_CYLINDER, transferId: ANOTHER, refrigerant: 'R-22', condition: 'clean', grossAfter: kg(12),
  ...(ownerOfRefrigerantId && { ownerOfRefrigerantId }),
})
const codes = (answer: { because: { code: string }[] }) => answer.because.map(({ code }) => code)

describe('used refrigerant that is drawn', () => {
  it('goes free back into the system it came from, into its owner\'s other equipment, and as a sample', () => {
    for (const story of [ours, theirs]) {
      for (const purpose of ['same-system', 'same-owner', 'sampling'] as const) expect(lastFindings(...story, drawn({ purpose }))).toEqual([])
    }
    expect(lastFindings(...theirs, drawn({ purpose: 'same-owner', toOwnerId: CUSTOMER }))).toEqual([])
    expect(lastFindings(...theirs, drawn({ purpose: 'same-system', toOwnerId: ANOTHER }))).toEqual([])
  })

  it('for anything else comes to a new owner, whosever it is, and is recorded all the same', () => {
    expect(lastFindings(...ours, drawn({ purpose: 'other' }))).toEqual(['owner-change'])
    expect(lastFindings(...theirs, drawn({ purpose: 'other' }))).toEqual(['owner-change'])
    expect(viewAfter([...ours, drawn({ purpose: 'other' })]).contents.netGrams).toBe(6_000)
  })

  it('comes to a new owner in equipment that is not its owner\'s, our own too', () => {
    expect(lastFindings(...theirs, drawn({ purpose: 'same-owner', toOwnerId: ANOTHER }))).toEqual(['owner-change'])
    expect(lastFindings(...ours, drawn({ purpose: 'same-owner', toOwnerId: CUSTOMER }))).toEqual(['owner-change'])
  })

  it('of two owners goes back into no equipment, but a sample of it is nobody\'s loss', () => {
    expect(lastFindings(...ofTwo, drawn({ purpose: 'same-system' }))).toEqual(['owner-change'])
    expect(lastFindings(...ofTwo, drawn({ purpose: 'same-owner' }))).toEqual(['owner-change'])
    expect(lastFindings(...ofTwo, drawn({ purpose: 'sampling' }))).toEqual([])
  })

  it('is refused as a plan with the paragraph, and free where no use is named', () => {
    const planned = mayDraw(viewAfter(theirs), { purpose: 'same-owner', toOwnerId: ANOTHER })
    expect(planned).toMatchObject({ allowed: false, because: [{ code: 'owner-change', severity: 'stop', source: '40 CFR 82.154(d); 42 U.S.C. 7675(h)(2)(B)' }] })
    expect(mayDraw(viewAfter(theirs), { purpose: 'same-owner', toOwnerId: CUSTOMER }).allowed).toBe(true)
    expect(mayDraw(viewAfter(ofTwo), { purpose: 'same-system' }).allowed).toBe(false)
    expect(mayDraw(viewAfter(ofTwo)).allowed).toBe(true)
  })

  it('is no plan at the cylinder where it is two owners\', but what is overfilled is drawn down all the same', () => {
    expect(viewAfter(ofTwo).mayNot).toContainEqual({ kind: 'drawn', because: expect.stringContaining('reclaimer only') })
    expect(viewAfter(theirs).may).toContain('drawn')
    // The limit of R-22 is 16 kg: a gross of 28 kg.
    expect(viewAfter([...ofTwo, filled('R-22', 29)]).may).toContain('drawn')
  })
})

describe('used refrigerant in another cylinder', () => {
  it('stays whose it was, and is not written to somebody else', () => {
    expect(lastFindings(...theirs, out(CUSTOMER))).toEqual([])
    expect(lastFindings(...ours, out())).toEqual([])
    expect(lastFindings(...theirs, out())).toEqual(['owner-change'])
    expect(lastFindings(...ours, out(CUSTOMER))).toEqual(['owner-change'])
  })

  it('of two owners may be brought together with more: it goes to a reclaimer anyhow', () => {
    expect(lastFindings(...ofTwo, out())).toEqual([])
  })
})

describe('a cylinder given to a firm in an exchange', () => {
  it('may hold used refrigerant only where the firm is a reclaimer', () => {
    expect(codes(mayGiveAway(viewAfter(ours), { isReclaimer: false }))).toEqual(['owner-change'])
    expect(codes(mayGiveAway(viewAfter(ours), { isReclaimer: true }))).toEqual([])
    expect(codes(mayGiveAway(viewAfter([registered()]), { isReclaimer: false }))).toEqual([])
  })

  it('counts as empty within what the scale can tell, not beyond', () => {
    // At 12 kg the default scale is good to 0.5 %: 60 g, at 12.06 kg to 61 g.
    expect(codes(mayGiveAway(viewAfter([...ours, drawn({ grossAfter: kg(12.06) })]), { isReclaimer: false }))).toEqual([])
    expect(codes(mayGiveAway(viewAfter([...ours, drawn({ grossAfter: kg(12.062) })]), { isReclaimer: false }))).toEqual(['owner-change'])
  })
})

describe('a cylinder that is another\'s', () => {
  const of = (ownership: 'rental' | 'deposit' | 'customer') => registered({ ownership, ownerId: SUPPLIER })

  it.each(['rental', 'deposit', 'customer'] as const)('is filled with its owner\'s consent, or the entry says that it was not asked for: %s', (ownership) => {
    expect(lastFindings(of(ownership), filled('R-22', 20))).toEqual(['owner-consent'])
    expect(lastFindings(of(ownership), filled('R-22', 20, { ownerConsents: true }))).toEqual([])
  })

  it('is asked about for what comes out of another cylinder too, and not for what goes out', () => {
    const into = (more: object) => did('transferred', {
      direction: 'in', counterpartId: OTHER_CYLINDER, transferId: ANOTHER, refrigerant: 'R-22', condition: 'clean', grossAfter: kg(15), ...more,
    })
    expect(lastFindings(of('deposit'), into({}))).toEqual(['owner-consent'])
    expect(lastFindings(of('deposit'), into({ ownerConsents: true }))).toEqual([])
    expect(lastFindings(of('deposit'), filled('R-22', 20, { ownerConsents: true }), drawn({}))).toEqual([])
  })

  it('is not asked about where it is our own', () => {
    expect(lastFindings(registered(), filled('R-22', 20))).toEqual([])
  })
})
