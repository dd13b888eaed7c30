import { describe, expect, it } from 'vitest'
import { DAY, did, filled, folded, kg, registered, REQUALIFIER, STAMP, START, VIEW_CONTEXT, type Told } from '~~/tests/helpers/custody'
import { cacheRow, rowToday } from '~~/utils/custody/row'
import { view } from '~~/utils/custody/view'
import type { ChoiceParagraph } from '~~/utils/requalification/ownerChoice'

const row = (story: Told[], nowMs: number) => {
  const { state } = folded(...story)
  return rowToday({ id: state.id, ...cacheRow(state, VIEW_CONTEXT) }, { ...VIEW_CONTEXT, nowMs })
}

describe('a line of the fleet', () => {
  const full = [registered(), filled('R-22', 20)]

  it('caches its codes between spaces, the most urgent first', () => {
    const { state } = folded(registered(), filled('R-22', 29), filled('R-134a', 30), did('lost', { cause: 'leak' }))
    expect(cacheRow(state, VIEW_CONTEXT)).toMatchObject({ findingCodes: ' overfill second-refrigerant early-test weight-not-known ', severity: 2, retestState: 'dated' })
    expect(cacheRow(folded(...full).state, VIEW_CONTEXT)).toMatchObject({ findingCodes: '', severity: 0 })
  })

  it('loses its stop weight and its room on the day after the due month ends, in the firm\'s zone', () => {
    // Due March 2029; Chicago is at UTC-5 by then.
    const firstOfApril = Date.UTC(2029, 3, 1, 5)
    expect(row(full, firstOfApril - 1)).toMatchObject({ stopWeightGrams: 28_000, exactStopWeightGrams: 28_000, roomGrams: 8000, fillLimitGrams: 16_000 })
    expect(row(full, firstOfApril)).toMatchObject({ stopWeightGrams: null, exactStopWeightGrams: null, roomGrams: null, fillLimitGrams: 16_000 })
    expect(row(full, firstOfApril).findingCodes).toContain('retest-overdue')
  })

  it('shows an overdue cylinder as a stop when nothing is in it, as a caution when something is', () => {
    const stamp = { ...STAMP, madeMonth: '2019-03' }
    const now = VIEW_CONTEXT.nowMs
    expect(row([registered({ stamp })], now).worstFinding).toEqual({ code: 'retest-overdue', severity: 'stop' })
    expect(row([registered({ stamp, contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(15) })], now).worstFinding)
      .toEqual({ code: 'retest-overdue', severity: 'caution' })
  })

  it('tells a cylinder that needs no retest from one whose date nobody knows', () => {
    const cached = (stamp: object) => cacheRow(folded(registered({ stamp: { ...STAMP, ...stamp } })).state, VIEW_CONTEXT)
    expect(cached({ spec: 'DOT-39' })).toMatchObject({ retestState: 'not-required', dueMonth: null })
    expect(cached({ madeMonth: null })).toMatchObject({ retestState: 'unknown', dueMonth: null, findingCodes: ' retest-unknown ' })
  })

  it('has the due month of the view, by whatever the owner chose', () => {
    const { state } = folded(registered(), did('retested', { month: '2026-07', method: 'proof', suffix: 'S', result: 'passed', requalifierId: REQUALIFIER }))
    const context = (paragraphs: ChoiceParagraph[]) => ({
      ...VIEW_CONTEXT, retest: { ...VIEW_CONTEXT.retest, ownerChoices: paragraphs.map(paragraph => ({ paragraph, reason: 'coated', from: null })) },
    })
    expect(cacheRow(state, context([])).dueMonth).toBe('2029-03')
    expect(cacheRow(state, context(['180.209(e)'])).dueMonth).toBe('2036-07')
    for (const paragraphs of [[], ['180.209(e)'], ['180.209(g)', '180.209(b)']] as ChoiceParagraph[][]) {
      expect(view(state, context(paragraphs)).requalification.dueMonth).toBe(cacheRow(state, context(paragraphs)).dueMonth)
    }
  })

  it('counts from when it was seen: a label stuck on is no sight of it', () => {
    const story = [registered(), did('labelled', { code: '7K3M9Q2TX' }, { occurredAt: START + 20 * DAY })]
    const on = (days: number) => row(story, START + days * DAY).unseen
    expect([29, 30, 89, 90].map(on)).toEqual([null, { days: 30, isLong: false }, { days: 89, isLong: false }, { days: 90, isLong: true }])
  })

  it('keeps a net of nothing apart from a net that nobody knows', () => {
    expect(cacheRow(folded(registered()).state, VIEW_CONTEXT)).toMatchObject({ netGrams: 0, nothingInIt: true })
    expect(cacheRow(folded(registered({ contents: 'unknown' })).state, VIEW_CONTEXT)).toMatchObject({ netGrams: null, nothingInIt: false })
  })
})
