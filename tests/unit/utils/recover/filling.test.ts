import { describe, expect, it } from 'vitest'
import type { MassReading } from '../../../../utils/quantity/mass'
import type { RecoveryPlan } from '../../../../utils/recover/plan'
import { minutesToStop } from '../../../../utils/recover/rate'
import { readingDoubt, withReading } from '../../../../utils/recover/readings'
import { fillStage } from '../../../../utils/recover/stage'
import { wayWords } from '../../../../utils/recover/words'

const lb = (value: number): MassReading => ({ unit: 'lb', value })
const kg = (value: number): MassReading => ({ unit: 'kg', value })
const at = (minutes: number, seconds = 0) => new Date(Date.UTC(2026, 6, 1, 10, minutes, seconds)).toISOString()
const ms = (minutes: number, seconds = 0) => Date.parse(at(minutes, seconds))

/**
 * TW 27.9 lb, WC 47.7 lb, limit 0.80 x 47.7 = 38.16 lb: stop at 66.06 lb, shown as 66.0. In grams 12655, 21636, 17309
 * and 29964.3; 90 % of the limit stands at 27.9 + 34.344 = 62.244 lb, 28233 g.
 */
const PLAN: RecoveryPlan = {
  refrigerant: 'R-410A', stopGrams: 66.06 * 453.59237, tareGrams: 12655, limitGrams: 17309, waterFullGrams: 12655 + 21636,
  rule: 'water weight', at: '2026-07-01T10:00:00.000-05:00',
}

describe('the stage of a filling', () => {
  it('turns at 90 % of the limit', () => {
    expect(fillStage(PLAN, lb(62.2))).toBe('below')
    expect(fillStage(PLAN, lb(62.3))).toBe('near')
    expect(fillStage(PLAN, kg(28.23))).toBe('below')
    expect(fillStage(PLAN, kg(28.24))).toBe('near')
  })

  it('is the stop from the stop weight on that the scale can show', () => {
    expect(fillStage(PLAN, lb(65.9))).toBe('near')
    expect(fillStage(PLAN, lb(66))).toBe('stop')
    // 29.96 of the 29.964 kg; 66 lb 0 oz of the 66 lb 0.96 oz.
    expect(fillStage(PLAN, kg(29.95))).toBe('near')
    expect(fillStage(PLAN, kg(29.96))).toBe('stop')
    expect(fillStage(PLAN, { unit: 'lb-oz', lb: 65, oz: 15 })).toBe('near')
    expect(fillStage(PLAN, { unit: 'lb-oz', lb: 66, oz: 0 })).toBe('stop')
  })

  it('is past it by more than the half gram that a conversion may lose', () => {
    expect(fillStage(PLAN, kg(29.964))).toBe('stop')
    expect(fillStage(PLAN, kg(29.965))).toBe('past')
    expect(fillStage(PLAN, lb(66.1))).toBe('past')
  })
})

describe('a reading', () => {
  it('below the last one is asked about', () => {
    expect(readingDoubt(PLAN, lb(62.3), lb(62.3))).toBeNull()
    expect(readingDoubt(PLAN, lb(62.2), lb(62.3))).toContain('less than 62.3\u00A0lb before')
    expect(readingDoubt(PLAN, lb(62.2), null)).toBeNull()
    // 28.259 kg is 62.3004 lb: the same in another unit is no less.
    expect(readingDoubt(PLAN, lb(62.3), kg(28.259))).toBeNull()
  })

  it('below the empty cylinder is asked about', () => {
    expect(readingDoubt(PLAN, lb(27.9), null)).toBeNull()
    expect(readingDoubt(PLAN, lb(27.8), null)).toContain('less than the empty cylinder weighs')
  })

  it('above what any refrigerant in it weighs is asked about', () => {
    // 12655 + 1.5 x 21636 = 45109 g.
    expect(readingDoubt(PLAN, kg(45.109), null)).toBeNull()
    expect(readingDoubt(PLAN, kg(45.11), null)).toContain('more than any refrigerant')
    expect(readingDoubt(PLAN, lb(623), null)).toContain('more than any refrigerant')
  })

  it('is kept, of more than two hundred the first and the last', () => {
    const many = Array.from({ length: 200 }, (_, index) => ({ at: at(0, index), gross: lb(index) }))
    expect(withReading(many.slice(0, 199), many[199]!)).toEqual(many)
    const more = withReading(many, { at: at(9), gross: lb(999) })
    expect([more.length, more[0]!.gross, more[1]!.gross, more.at(-1)!.gross]).toEqual([200, lb(0), lb(2), lb(999)])
  })
})

describe('the minutes to the stop', () => {
  // A pound a minute: 60.0, 61.0, 62.0 lb; 4.06 lb are left.
  const steady = [{ at: at(0), gross: lb(60) }, { at: at(1), gross: lb(61) }, { at: at(2), gross: lb(62) }]
  const minutes = (readings: typeof steady, now: number) => minutesToStop(readings, PLAN.stopGrams, now)

  it('go down with the clock, rounded down, and never below nothing', () => {
    expect(minutes(steady, ms(2))).toBe(4)
    // 4.06 min less 3 s is 4.01; less 5 s is 3.98.
    expect(minutes(steady, ms(2, 3))).toBe(4)
    expect(minutes(steady, ms(2, 5))).toBe(3)
    expect(minutes(steady, ms(9))).toBe(0)
  })

  it('are told by three readings over a minute, not by two, nor within less', () => {
    expect(minutes(steady.slice(1), ms(2))).toBeNull()
    const fast = (last: string) => [{ at: at(0), gross: lb(60) }, { at: at(0, 30), gross: lb(60.5) }, { at: last, gross: lb(61) }]
    expect(minutes(fast(at(0, 59)), ms(1))).toBeNull()
    expect(minutes(fast(at(1)), ms(1))).toBe(5)
  })

  it('are not told by a reading older than a quarter of an hour', () => {
    const slow = [{ at: at(0), gross: lb(60) }, { at: at(5), gross: lb(60.5) }, { at: at(10), gross: lb(61) }]
    expect(minutes(slow, ms(25))).toBe(35)
    expect(minutes(slow, ms(25, 1))).toBeNull()
  })

  it('are not told where the scale stands still, flickers or falls', () => {
    const gain = (value: number) => [{ at: at(0), gross: lb(60) }, { at: at(1), gross: lb(60) }, { at: at(2), gross: lb(60 + value) }]
    expect(minutes(gain(0), ms(2))).toBeNull()
    expect(minutes(gain(0.1), ms(2))).toBeNull()
    expect(minutes([...steady].reverse().map((one, index) => ({ ...one, at: at(index) })), ms(2))).toBeNull()
  })

  it('are not moved by one slip of the finger among six', () => {
    const six = [60, 60.5, 61, 16.5, 62, 62.5].map((value, index) => ({ at: at(0, index * 30), gross: lb(value) }))
    // A pound a minute all the same: 3.56 lb are left.
    expect(minutes(six, ms(2, 30))).toBe(3)
  })

  it('are not told at the stop, nor of more than ten hours', () => {
    expect(minutes([...steady, { at: at(6), gross: lb(66.1) }], ms(6))).toBeNull()
    const over = (pounds: number) => [0, 5, 10].map(minute => ({ at: at(minute), gross: lb(60 + pounds * minute / 10) }))
    // A quarter of a pound in 10 min: 5.81 lb take 232.4 min, 14.95 lb 598 min and 15.05 lb 602 min.
    expect(minutes(over(0.25), ms(10))).toBe(232)
    expect(minutesToStop(over(0.25), 75.2 * 453.59237, ms(10))).toBe(598)
    expect(minutesToStop(over(0.25), 75.3 * 453.59237, ms(10))).toBeNull()
  })
})

describe('the words of the way', () => {
  it('round what may still go in down, and an excess up', () => {
    expect(wayWords(PLAN, lb(62.3), 'near', 6, 'lb')).toEqual({
      head: '3.7\u00A0lb to go, about 6 min', line: 'Past 90 % of 38.1\u00A0lb, limit by water weight',
    })
    expect(wayWords(PLAN, lb(50.5), 'below', null, 'lb').head).toBe('15.5\u00A0lb to go')
    // 66.5 - 66.06 = 0.44 lb.
    expect(wayWords(PLAN, lb(66.5), 'past', null, 'lb').head).toBe('0.5\u00A0lb past the stop')
  })
})
