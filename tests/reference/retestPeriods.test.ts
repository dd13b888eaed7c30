import { describe, expect, it } from 'vitest'
import { CHOICE_PARAGRAPHS, CHOICE_TERMS, type ChoiceParagraph, type OwnerChoice } from '~~/utils/requalification/ownerChoice'
import { requalification, type RequalificationMark } from '~~/utils/requalification/requalification'

function chosen(...paragraphs: ChoiceParagraph[]): OwnerChoice[] {
  return paragraphs.map(paragraph => ({ paragraph, reason: 'its service is known', from: null }))
}

function stand(spec: string, marks: RequalificationMark[], choices: OwnerChoice[] = [], more: { made?: string, on?: number, refrigerant?: string } = {}) {
  return requalification({
    steel: {
      spec,
      madeMonth: more.made ?? '2010-05',
      waterCapacityGrams: 20_000,
      service: { isOwn: true, dedicatedTo: more.refrigerant ?? null, holds: [], hasHeldBurnt: false },
    },
    marks,
    nowMs: more.on ?? Date.UTC(2034, 0, 15),
    timeZone: 'America/Chicago',
    rules: { intervalMonths: null, ownerChoices: choices },
  })
}

// 49 CFR 180.209(a) Table 1 after the rule effective 30 November 2020: the periods of each row in years.
const TABLE_1: [specs: string[], years: number[]][] = [
  [['3A', '3AA', '3A480X'], [5, 10, 12]],
  [['3AL'], [5, 12]],
  [['3AX', '3AAX'], [5]],
  [['3B', '3BN'], [5, 10]],
  [['3HT'], [3]],
  [['3T'], [5]],
  [['4AA480'], [5, 10]],
  [['4B', '4BA', '4BW', '4B240ET'], [5, 7, 10, 12]],
  [['4D', '4DA', '4DS'], [5]],
  [['4E'], [5, 10, 12]],
  [['8', '8AL'], [10, 20]],
]
const ROWS = TABLE_1.flatMap(([specs, years]) => specs.map(spec => ({ spec, years })))

describe('49 CFR 180.209(a), Table 1', () => {
  it.each(ROWS)('$spec goes by the shortest of $years years where nothing is chosen', ({ spec, years }) => {
    expect(stand(`DOT-${spec}`, [{ month: '2024-01' }]).intervalMonths).toBe(years[0]! * 12)
    expect(stand(`DOT-${spec}`, [], [], { made: '2024-01' }).intervalMonths).toBe(years[0]! * 12)
  })

  it.each(ROWS)('$spec goes by no period that is not in $years, whatever is chosen', ({ spec, years }) => {
    for (const suffix of ['', '*', 'S', 'E', 'UE']) {
      for (const refrigerant of ['R-410A', 'R-717']) {
        const { lastMonth, intervalMonths } = stand(`DOT-${spec}`, [{ month: '2024-01', suffix }], chosen(...CHOICE_PARAGRAPHS), { refrigerant })
        if (lastMonth === '2024-01') expect(years.map(count => count * 12)).toContain(intervalMonths)
      }
    }
  })

  it.each(['3E', '4L'])('%s is not requalified', (spec) => {
    expect(stand(`DOT-${spec}`, [{ month: '1990-01' }]).state).toBe('not-required')
  })

  // 49 CFR 178.65: not to be refilled, so never to be tested for it.
  it('39 is not in it', () => {
    expect(stand('DOT-39', []).state).toBe('not-required')
  })
})

// 49 CFR 180.209(e), as quoted from its form of October 2026: the first requalification within 12 years of manufacture,
// then every 12 years by volumetric expansion, or every 10 by proof pressure.
describe('49 CFR 180.209(e), worked by hand for a 4BA made in May 2010', () => {
  const due = (marks: RequalificationMark[]) => stand('DOT-4BA', marks, chosen('180.209(e)')).dueMonth

  it('is first due in May 2022', () => {
    expect(due([])).toBe('2022-05')
  })

  it('then by proof pressure in May 2032', () => {
    expect(due([{ month: '2022-05', suffix: 'S' }])).toBe('2032-05')
  })

  it('or by volumetric expansion in May 2034', () => {
    expect(due([{ month: '2022-05' }])).toBe('2034-05')
  })

  it('and from a proof pressure test before its time, ten years from that', () => {
    expect(due([{ month: '2021-11', suffix: 'S' }])).toBe('2031-11')
  })

  it('covers 4B, 4BA, 4BW and 4E', () => {
    expect(CHOICE_TERMS['180.209(e)'].specs).toEqual(['DOT-4B', 'DOT-4BA', 'DOT-4BW', 'DOT-4E'])
  })
})

// 49 CFR 180.209(b), (g), (h), edition of October 2019.
describe('the other paragraphs of 49 CFR 180.209', () => {
  it('(b): ten years after a star on a 3AA', () => {
    expect(stand('DOT-3AA', [{ month: '2024-01', suffix: '*' }], chosen('180.209(b)')).dueMonth).toBe('2034-01')
    expect(stand('DOT-3AA', [{ month: '2024-01' }], chosen('180.209(b)')).dueMonth).toBe('2029-01')
  })

  it('(g): five years after an outside look at a 4BW', () => {
    expect(stand('DOT-4BW', [{ month: '2024-01', suffix: 'E' }], chosen('180.209(g)')).dueMonth).toBe('2029-01')
  })

  it('(h): ten years for a 4AA480 dedicated to ammonia', () => {
    expect(stand('DOT-4AA480', [{ month: '2024-01' }], chosen('180.209(h)'), { refrigerant: 'R-717' }).dueMonth).toBe('2034-01')
    expect(stand('DOT-4AA480', [{ month: '2024-01' }], chosen('180.209(h)'), { refrigerant: 'R-22' }).dueMonth).toBe('2029-01')
  })
})

// 49 CFR 180.205(c): at any time up to and including the month and year it is due. Chicago keeps UTC-5 in May.
describe('the month in which 49 CFR 180.205(c) lets a test fall due', () => {
  const firstOfJune = Date.UTC(2022, 5, 1, 5)

  it('is May 2022 to its last millisecond, twelve years after May 2010', () => {
    expect(stand('DOT-4BA', [], chosen('180.209(e)'), { on: firstOfJune - 1 }).state).toBe('due-soon')
    expect(stand('DOT-4BA', [], chosen('180.209(e)'), { on: firstOfJune }).state).toBe('overdue')
  })

  it('is May 2015 where nothing is chosen, five years after May 2010', () => {
    const firstOfJune2015 = Date.UTC(2015, 5, 1, 5)
    expect(stand('DOT-4BA', [], [], { on: firstOfJune2015 - 1 }).state).toBe('due-soon')
    expect(stand('DOT-4BA', [], [], { on: firstOfJune2015 }).state).toBe('overdue')
  })
})
