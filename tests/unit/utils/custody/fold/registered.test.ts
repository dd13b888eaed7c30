import { describe, expect, it } from 'vitest'
import {
  codes, contentsAfter, CUSTOMER, filled, folded, HOUR, idOf, kg, lastMovements, registered, SHOP, STAMP, START, viewAfter, weighed,
} from '~~/tests/helpers/custody'

describe('a registered cylinder', () => {
  it('stands at its place with its stamp, in service', () => {
    const { state } = folded(registered())
    expect(state.placeId).toBe(SHOP)
    expect(state.stamp?.serial).toBe('A1001')
    expect(viewAfter([registered()]).lifecycle).toBe('in-service')
  })

  it('has nothing in it when it came evacuated, reckoned where it was not weighed', () => {
    expect(contentsAfter(registered())).toMatchObject({ nothingInIt: true, evacuated: true, netGrams: 0, basis: 'reckoned', refrigerant: null })
  })

  it('counts as evacuated up to the accuracy of the scale and as unknown a gram above it', () => {
    expect(contentsAfter(registered({ gross: kg(12.06) }))).toMatchObject({ nothingInIt: true, netGrams: 0, basis: 'weighed' })
    // At 12.062 kg half a percent is 60.31 g, rounded up to 61.
    expect(contentsAfter(registered({ gross: kg(12.062) }))).toMatchObject({ nothingInIt: false, evacuated: false, netGrams: 62, condition: 'unknown' })
  })

  it('has contents that nobody knows when that was said, or when nothing was said', () => {
    const unsaid = { contents: undefined }
    for (const contents of [{ contents: 'unknown' as const }, unsaid]) {
      expect(contentsAfter(registered(contents))).toMatchObject({ nothingInIt: false, refrigerant: null, condition: 'unknown', netGrams: null })
    }
  })

  it('holds what it came with, as an opening of the firm, or of the customer whose cylinder it is', () => {
    const came = { contents: { refrigerant: 'R-22', condition: 'clean' as const }, gross: kg(15) }
    expect(contentsAfter(registered(came))).toMatchObject({ refrigerant: 'R-22', condition: 'clean', netGrams: 3000, basis: 'weighed', uncertaintyGrams: 75 })
    expect(lastMovements(registered(came))).toEqual(['opening R-22 3000'])
    expect(lastMovements(registered({ ...came, ownership: 'customer', ownerId: CUSTOMER }))).toEqual(['opening R-22 3000 f1'])
  })

  it('has no tare where the stamp has none, and none where the stamped one leaves the valve out', () => {
    for (const stamp of [{ ...STAMP, tareWeight: null }, { ...STAMP, tareIncludesValve: false }]) {
      const shown = viewAfter([registered({ stamp, contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(15) })])
      expect(shown.contents.netGrams).toBeNull()
      expect(shown.capacity.missing).toEqual(['tareWeight', 'weight'])
      expect(shown.capacity.stopWeightGrams).toBeNull()
    }
  })

  it('begins with its registration whatever the times say: what happened before it stays', () => {
    const story = [weighed(15), registered({ contents: { refrigerant: 'R-22', condition: 'clean' }, gross: kg(14) }, { occurredAt: START + 9 * HOUR })]
    expect(contentsAfter(...story)).toMatchObject({ refrigerant: 'R-22', netGrams: 3000 })
    const { steps, state } = folded(...story)
    expect(steps.map(step => step.eventId)).toEqual([idOf(0), idOf(1)])
    expect(state.lastEventKind).toBe('registered')
  })

  it('keeps the first registration in effect and says that there is a second', () => {
    const story = [registered(), registered({ stamp: { ...STAMP, tareWeight: kg(9), serial: 'B2' } })]
    const shown = viewAfter(story)
    expect(shown.stamp?.serial).toBe('A1001')
    expect(shown.findings.find(({ code }) => code === 'registered-twice')).toMatchObject({ severity: 'caution', since: '2026-07-01T18:00:00.000Z' })
  })

  it('is asked for where events came without one, and gives no number until then', () => {
    const shown = viewAfter([filled('R-22', 15)])
    expect(codes(shown)).toContain('not-registered')
    expect(shown.stamp).toBeNull()
    expect(shown.capacity).toMatchObject({ stopWeightGrams: null, roomGrams: null, fillLimitGrams: null })
    expect(codes(viewAfter([filled('R-22', 15), registered()]))).not.toContain('not-registered')
  })
})
