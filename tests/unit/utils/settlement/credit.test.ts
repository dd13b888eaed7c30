import { describe, expect, it } from 'vitest'
import { lineCreditCents, settlementCredit } from '../../../../utils/settlement/credit'
import { creditOfReading } from '../../../../utils/settlement/creditOfReading'
import { NOTHING_SAID, type LineFigures } from '../../../../utils/settlement/figures'

const TAKEN: LineFigures = { ...NOTHING_SAID, outcome: 'taken-over', acceptedNet: { unit: 'lb', value: 11 }, rate: { mills: 2_400, per: 'lb' } }
const NO_STATEMENT = { number: null, day: null, others: [], totalCents: null }

describe('the credit of a reading', () => {
  it('is reckoned from the reading itself, for whole grams would be a cent off', () => {
    // 33.3 x 8.00 = 266.40; of 15,105 g it would be 266.41.
    expect(creditOfReading({ mills: 8_000, per: 'lb' }, { unit: 'lb', value: 33.3 })).toBe(26_640)
  })

  it('rounds half a cent away from zero, either way', () => {
    // 0.5 lb at 0.01 is half a cent; at 0.009 it is 0.45 of one.
    expect(creditOfReading({ mills: 10, per: 'lb' }, { unit: 'lb', value: 0.5 })).toBe(1)
    expect(creditOfReading({ mills: 9, per: 'lb' }, { unit: 'lb', value: 0.5 })).toBe(0)
    expect(creditOfReading({ mills: -10, per: 'lb' }, { unit: 'lb', value: 0.5 })).toBe(-1)
    expect(Object.is(creditOfReading({ mills: -9, per: 'lb' }, { unit: 'lb', value: 0.5 }), 0)).toBe(true)
  })

  it('reckons pounds at a price for a kilogram, and kilograms at one for a pound', () => {
    // 10 lb = 4.5359237 kg; x 5.00 = 22.6796. 10 kg = 22.0462 lb; x 2.40 = 52.9109.
    expect(creditOfReading({ mills: 5_000, per: 'kg' }, { unit: 'lb', value: 10 })).toBe(2_268)
    expect(creditOfReading({ mills: 2_400, per: 'lb' }, { unit: 'kg', value: 10 })).toBe(5_291)
    expect(creditOfReading({ mills: 2_400, per: 'lb' }, { unit: 'lb-oz', lb: 10, oz: 8 })).toBe(2_520)
  })
})

describe('the credit of a line', () => {
  it('is its price times the accepted net; below zero where it is charged', () => {
    expect(lineCreditCents(TAKEN)).toBe(2_640)
    expect(lineCreditCents({ ...TAKEN, rate: { mills: -1_500, per: 'lb' } })).toBe(-1_650)
    expect(lineCreditCents({ ...TAKEN, acceptedNet: { unit: 'lb', value: 0 } })).toBe(0)
  })

  it('is not known without a price or an accepted net, and there is none for what was not taken over', () => {
    expect(lineCreditCents({ ...TAKEN, rate: null })).toBeNull()
    expect(lineCreditCents({ ...TAKEN, acceptedNet: null })).toBeNull()
    expect(lineCreditCents({ ...TAKEN, outcome: 'sent-back' })).toBeNull()
    expect(lineCreditCents({ ...TAKEN, outcome: 'not-arrived' })).toBeNull()
  })
})

describe('the credit of a settlement', () => {
  const line = (cylinderId: string, figures: LineFigures) => ({ cylinderId, sent: null, figures })

  it('is the sum of its lines and the other amounts, beside what the statement says', () => {
    const credit = settlementCredit({
      lines: [line('a', { ...TAKEN, statedCents: 2_640 }), line('b', { ...TAKEN, rate: { mills: -1_500, per: 'lb' }, statedCents: -1_700 })],
      statement: { ...NO_STATEMENT, others: [{ what: 'Pick-up', cents: -500 }], totalCents: 490 },
      unexpected: [],
    })
    expect(credit).toMatchObject({ linesCents: 990, othersCents: -500, totalCents: 490, differenceCents: 0, unknownLines: 0 })
    expect(credit.lines.map(one => one.differenceCents)).toEqual([0, -50])
  })

  it('has no total while a line is not known, and tells a cent of difference', () => {
    const unknown = settlementCredit({ lines: [line('a', TAKEN), line('b', { ...TAKEN, rate: null })], statement: { ...NO_STATEMENT, totalCents: 2_640 }, unexpected: [] })
    expect(unknown).toMatchObject({ linesCents: 2_640, totalCents: null, differenceCents: null, unknownLines: 1 })
    expect(settlementCredit({ lines: [line('a', TAKEN)], statement: { ...NO_STATEMENT, totalCents: 2_641 }, unexpected: [] }).differenceCents).toBe(1)
  })

  it('is not nothing while no line is known, and nothing where none was taken over', () => {
    expect(settlementCredit({ lines: [line('a', NOTHING_SAID)], statement: NO_STATEMENT, unexpected: [] })).toMatchObject({ linesCents: null, totalCents: null, unknownLines: 1 })
    expect(settlementCredit({ lines: [line('a', { ...NOTHING_SAID, outcome: 'sent-back' })], statement: NO_STATEMENT, unexpected: [] })).toMatchObject({ linesCents: 0, totalCents: 0, unknownLines: 0 })
  })

  it('leaves out what was sent back or never arrived, and tells a credit that is stated for it', () => {
    const credit = settlementCredit({ lines: [line('a', TAKEN), line('b', { ...NOTHING_SAID, outcome: 'sent-back', statedCents: 900 })], statement: NO_STATEMENT, unexpected: [] })
    expect(credit).toMatchObject({ totalCents: 2_640, unknownLines: 0 })
    expect(credit.lines[1]).toMatchObject({ cents: null, differenceCents: 900 })
  })
})
