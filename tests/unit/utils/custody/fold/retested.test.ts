import { describe, expect, it } from 'vitest'
import {
  codes, contentsAfter, CUSTOMER, did, filled, kg, lastFindings, lastMovements, LOT, registered, REQUALIFIER, STAMP, TEST_PLACE, viewAfter, weighed,
} from '~~/tests/helpers/custody'
import type { DetailsOf } from '~~/utils/custody/schema'

const retested = (details: Partial<DetailsOf<'retested'>> = {}) => did('retested', {
  month: '2026-07', method: 'volumetric', result: 'passed', requalifierId: REQUALIFIER, ...details,
})
const CHOICE = { paragraph: '180.209(e)' as const, reason: 'coated, analyzed refrigerant only', from: null }
const byChoice = { retest: { soonDays: 120, notSeenDays: 30, missingDays: 90, intervalMonths: null, ownerChoices: [CHOICE] } }
const atTest = [registered(), did('sent-for-test', { lotId: LOT }, { placeId: TEST_PLACE })]
const full = [registered(), filled('R-22', 20)]

describe('a passed test', () => {
  it('moves the due month, ends the stay and stays on record as a mark', () => {
    const shown = viewAfter([...atTest, retested({ rin: 'A123', suffix: '+' })])
    expect(viewAfter(atTest)).toMatchObject({ lifecycle: 'at-test', requalification: { dueMonth: '2029-03' } })
    expect(shown).toMatchObject({ lifecycle: 'in-service', requalification: { lastMonth: '2026-07', dueMonth: '2031-07', state: 'in-date' } })
    expect(shown.marks).toEqual([{ month: '2026-07', method: 'volumetric', rin: 'A123', suffix: '+' }])
  })

  it('dated after the month it was entered in does not count', () => {
    expect(viewAfter([...atTest, retested({ month: '2026-08' })], { nowMs: Date.UTC(2027, 0, 1) }).requalification.dueMonth).toBe('2029-03')
  })

  it('by a look alone does not move the due month', () => {
    expect(viewAfter([...atTest, retested({ method: 'visual' })]).requalification.dueMonth).toBe('2029-03')
  })

  it('by proof pressure moves the due month only by the owner\'s choice, and for ten years', () => {
    const story = [...atTest, retested({ method: 'proof', suffix: 'S' })]
    expect(viewAfter(story).requalification).toMatchObject({ dueMonth: '2029-03', choice: null })
    expect(viewAfter(story, byChoice).requalification).toMatchObject({ dueMonth: '2036-07', choice: CHOICE })
  })

  it('holds twelve years by the owner\'s choice, but not once burnt refrigerant was in it, nor after a vacuum', () => {
    const burnt = [registered(), filled('R-22', 20, { condition: 'burnt' }), did('emptied', { vacuum: { microns: 400 } })]
    expect(viewAfter([...atTest, retested()], byChoice).requalification.dueMonth).toBe('2038-07')
    expect(viewAfter([...burnt, retested()], byChoice).requalification).toMatchObject({ dueMonth: '2031-07', choice: null })
    expect(viewAfter([...burnt, retested()], byChoice).contents.burnt).toBe(false)
    expect(viewAfter([registered({ contents: { refrigerant: 'R-22', condition: 'burnt' } }), retested()], byChoice).requalification.dueMonth).toBe('2031-07')
  })

  it.each(['rental', 'deposit', 'customer'] as const)('holds no twelve years by our choice in a %s cylinder', (ownership) => {
    const story = [registered({ ownership, ownerId: CUSTOMER }), retested()]
    expect(viewAfter(story, byChoice).requalification).toMatchObject({ dueMonth: '2031-07', choice: null })
  })

  it('with water leaves it wet and empty, with no stop weight until it is evacuated', () => {
    for (const method of ['volumetric', 'proof'] as const) {
      const shown = viewAfter([...full, weighed(12.5), retested({ method })])
      expect(shown).toMatchObject({ holds: ['wet'], contents: { nothingInIt: true, evacuated: false, netGrams: 0, basis: 'reckoned' }, capacity: { stopWeightGrams: null } })
      expect(codes(shown)).toEqual(['wet'])
    }
    expect(viewAfter([...full, retested({ method: 'visual' })])).toMatchObject({ holds: [], contents: { refrigerant: 'R-22', netGrams: 8000 } })
  })

  it('with more in it than vapour is a stop, and what was in it is lost', () => {
    // 20.0192 L of R-22 vapour at 77 F, 44.23 kg/m3: 885 g.
    const after = (grossKg: number) => lastFindings(...full, weighed(grossKg), retested())
    expect(after(12.885)).toEqual([])
    expect(after(12.886)).toEqual(['tested-full'])
    expect(lastMovements(...full, retested())).toEqual(['emptied-loss R-22 -8000'])
  })

  it('with a gas that has no vapour heel at 77 F is a stop for anything the scale can tell from nothing', () => {
    const carbonDioxide = (grossKg: number) => [
      registered({ stamp: { ...STAMP, spec: 'DOT-3AA', servicePressurePsig: 2400 }, contents: { refrigerant: 'R-744', condition: 'clean' }, gross: kg(grossKg) }), retested(),
    ]
    expect(lastFindings(...carbonDioxide(12.06))).toEqual([])
    expect(lastFindings(...carbonDioxide(12.2))).toEqual(['tested-full'])
  })

  it('does not clean a burnt cylinder nor lift a second refrigerant', () => {
    const story = [registered(), filled('R-22', 14, { condition: 'burnt' }), filled('R-134a', 15), retested()]
    expect(contentsAfter(...story).burnt).toBe(true)
    expect(codes(viewAfter(story))).toContain('second-refrigerant')
  })
})

describe('a failed test', () => {
  it('rejects the cylinder until one passes', () => {
    const story = [...atTest, retested({ method: 'visual', result: 'rejected' })]
    expect(viewAfter(story)).toMatchObject({ lifecycle: 'rejected', holds: ['rejected'], capacity: { stopWeightGrams: null }, marks: [] })
    expect(viewAfter([...story, retested({ method: 'proof' })])).toMatchObject({ lifecycle: 'in-service', holds: ['wet'] })
  })

  it('and damage and a lost tare are not cleared by an outside look', () => {
    const look = retested({ method: 'visual' })
    expect(viewAfter([...atTest, retested({ result: 'rejected' }), look])).toMatchObject({ lifecycle: 'rejected', holds: ['wet', 'rejected'], capacity: { stopWeightGrams: null } })
    const leaked = [...full, did('lost', { cause: 'leak', grossAfter: kg(15) })]
    expect(viewAfter([...leaked, look])).toMatchObject({ holds: ['damaged'], capacity: { stopWeightGrams: null, refusals: [{ code: 'early-test' }] } })
    const light = [registered(), retested({ method: 'visual', newTare: kg(11.4) })]
    expect(viewAfter([...light, look])).toMatchObject({ holds: ['tare-loss'], capacity: { stopWeightGrams: null } })
  })

  it('condemns it for good', () => {
    const story = [...atTest, retested({ method: 'visual', result: 'condemned' })]
    expect(viewAfter([...story, retested()])).toMatchObject({ lifecycle: 'condemned', capacity: { stopWeightGrams: null } })
    expect(codes(viewAfter(story))).toEqual(['condemned'])
  })

  it('leaves a condemned cylinder only with the findings of its contents and of what came after', () => {
    const story = [registered(), filled('R-22', 30), retested({ method: 'visual', result: 'condemned' }), filled('R-22', 31)]
    expect(lastFindings(...story)).toEqual(['after-end', 'overfill'])
    expect(codes(viewAfter(story, { nowMs: Date.UTC(2040, 0, 1) }))).toEqual(['overfill', 'condemned', 'after-end'])
  })
})

describe('a new tare', () => {
  it('holds from then on: the net follows the same reading, the stop weight the new tare', () => {
    const story = [...full, retested({ method: 'visual', newTare: kg(12.1) })]
    expect(lastMovements(...story)).toEqual(['tare-change R-22 -100'])
    expect(viewAfter(story)).toMatchObject({ stamp: { tareWeightGrams: 12_100 }, contents: { netGrams: 7900 }, capacity: { stopWeightGrams: 28_100, roomGrams: 8100 } })
    expect(contentsAfter(...story, weighed(20))).toMatchObject({ netGrams: 7900 })
  })

  it('changes nothing before it', () => {
    expect(lastMovements(...full, retested({ method: 'visual', newTare: kg(12.1) }), weighed(19.9))).toEqual(['weighing R-22 -100'])
  })

  it('makes a net known where the stamp has no tare', () => {
    const story = [
      registered({ stamp: { ...STAMP, tareWeight: null }, contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(15) }),
      retested({ method: 'visual', newTare: kg(12) }),
    ]
    expect(viewAfter(story)).toMatchObject({ contents: { netGrams: 3000 }, capacity: { stopWeightGrams: 28_000, missing: [] } })
  })

  it('is taken after a wet test has emptied the cylinder, so that nothing changes with it', () => {
    expect(lastMovements(...full, retested({ newTare: kg(12.1) }))).toEqual(['emptied-loss R-22 -8000'])
  })

  it('more than 5 % above the stamp is to be weighed again, for the stop weight rises with it', () => {
    // 5 % of 12.00 kg is 0.60 kg.
    expect(lastFindings(...atTest, retested({ newTare: kg(12.6) }))).toEqual([])
    expect(lastFindings(...atTest, retested({ newTare: kg(12.601) }))).toEqual(['weigh-again'])
    const withoutValve = registered({ stamp: { ...STAMP, tareIncludesValve: false } })
    expect(lastFindings(withoutValve, retested({ newTare: kg(13.2) }))).toEqual([])
  })

  it('5 % below the stamp has lost steel: no fill until a test has passed with that in view', () => {
    // 5 % of 12.00 kg is 0.60 kg.
    expect(viewAfter([...atTest, retested({ method: 'visual', newTare: kg(11.401) })]).holds).toEqual([])
    const story = [...atTest, retested({ method: 'visual', newTare: kg(11.4) })]
    expect(viewAfter(story)).toMatchObject({ holds: ['tare-loss'], capacity: { stopWeightGrams: null } })
    expect(codes(viewAfter(story))).toEqual(['early-test'])
    expect(viewAfter([...story, retested({ newTare: kg(11.4) })]).holds).toEqual(['wet'])
  })
})
