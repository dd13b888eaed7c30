import { describe, expect, it } from 'vitest'
import { codes, contentsAfter, DAY, filled, folded, HOUR, lastFindings, registered, START, SUPERVISOR, viewAfter, weighed } from '~~/tests/helpers/custody'

const MINUTE = 60_000

describe('an event\'s time', () => {
  it('is put right by a clock two days fast, and doubted', () => {
    const fast = weighed(19, { occurredAt: START + 2 * HOUR + 2 * DAY, clockSkewSeconds: 2 * 86_400, recordedAt: START + 5 * HOUR })
    const story = [registered(), filled('R-22', 20), fast]
    expect(lastFindings(...story)).toEqual(['clock-doubtful'])
    expect(folded(...story).state.lastEventAt).toBe(START + 2 * HOUR)
    // A later weighing by a right clock stands after it.
    expect(contentsAfter(...story, weighed(18, { occurredAt: START + 3 * HOUR })).netGrams).toBe(6000)
  })

  it('is doubted from a skew above five minutes on, either way', () => {
    const skewed = (clockSkewSeconds: number) => lastFindings(registered(), filled('R-22', 20), weighed(19, {
      clockSkewSeconds, occurredAt: START + 2 * HOUR + clockSkewSeconds * 1000, recordedAt: START + 5 * HOUR,
    }))
    expect(skewed(300)).toEqual([])
    expect(skewed(301)).toEqual(['clock-doubtful'])
    expect(skewed(-301)).toEqual(['clock-doubtful'])
  })

  it('is not doubted for a phone less than a minute fast, though it is held back', () => {
    const ahead = (ms: number) => weighed(19, { occurredAt: START + 2 * HOUR + ms, recordedAt: START + 2 * HOUR })
    expect(lastFindings(registered(), filled('R-22', 20), ahead(MINUTE - 1))).toEqual([])
    expect(lastFindings(registered(), filled('R-22', 20), ahead(MINUTE))).toEqual(['clock-doubtful'])
    expect(folded(registered(), filled('R-22', 20), ahead(MINUTE - 1)).state.lastEventAt).toBe(START + 2 * HOUR)
  })

  it('is held back to its recording where it claims to be later', () => {
    const early = weighed(19, { occurredAt: START + 9 * HOUR, recordedAt: START + 2 * HOUR })
    expect(lastFindings(registered(), filled('R-22', 20), early)).toEqual(['clock-doubtful'])
    expect(folded(registered(), filled('R-22', 20), early).state.lastEventAt).toBe(START + 2 * HOUR)
  })

  it('that arrives late falls into its place', () => {
    const late = weighed(19.5, { occurredAt: START + HOUR + 30 * MINUTE, recordedAt: START + 9 * HOUR })
    const story = [registered(), filled('R-22', 20), weighed(19, { occurredAt: START + 2 * HOUR }), late]
    expect(contentsAfter(...story).netGrams).toBe(7000)
    expect(folded(...story).movements.map(({ grams }) => grams)).toEqual([8000, -500, -500])
  })
})

describe('a trainee\'s event', () => {
  const trainee = { trainee: true, supervisorId: SUPERVISOR }

  it('counts in the steel, apart in the totals, and waits for a signature', () => {
    const { state, movements } = folded(registered(), filled('R-22', 20, {}, trainee))
    expect(state.contents.netGrams).toBe(8000)
    expect(movements).toMatchObject([{ cause: 'recovered', apart: true }])
    expect(codes(viewAfter([registered(), filled('R-22', 20, {}, trainee)]))).toEqual(['unsigned'])
  })

  it('without a supervisor is a stop', () => {
    expect(codes(viewAfter([registered(), filled('R-22', 20, {}, { trainee: true })]))).toEqual(['unsupervised', 'unsigned'])
  })
})

describe('a practice event', () => {
  it('counts in the steel and apart in the totals', () => {
    const { state, movements } = folded(registered(), filled('R-22', 20, {}, { practice: true }))
    expect(state.contents.netGrams).toBe(8000)
    expect(movements.map(({ apart }) => apart)).toEqual([true])
  })
})
