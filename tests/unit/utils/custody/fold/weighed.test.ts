import { describe, expect, it } from 'vitest'
import {
  codes, contentsAfter, did, filled, folded, kg, lastFindings, lastMovements, registered, STAMP, viewAfter, weighed, FOLD_CONTEXT, recorded,
} from '~~/tests/helpers/custody'
import { fold } from '~~/utils/custody/fold'

const full = [registered(), filled('R-22', 20)]

describe('a weighed cylinder', () => {
  it('has a net of gross less tare, and books the change', () => {
    expect(contentsAfter(...full, weighed(19.5))).toMatchObject({ netGrams: 7500, basis: 'weighed', refrigerant: 'R-22' })
    expect(lastMovements(...full, weighed(19.5))).toEqual(['weighing R-22 -500'])
    expect(lastMovements(...full, weighed(20.25))).toEqual(['weighing R-22 250'])
    expect(lastFindings(...full, weighed(19.5))).toEqual([])
  })

  it('has the accuracy of its scale as the uncertainty of its net', () => {
    const scales = new Map([['s', { id: 's', name: 'bench', accuracyGrams: 5, accuracyPercent: 0, lastCheck: null }]])
    const { state } = fold(recorded(registered(), did('weighed', { gross: kg(12.006), scaleId: 's' })), { ...FOLD_CONTEXT, scales })
    // 6 g above the tare on a scale good to 5 g: something is in it.
    expect(state.contents).toMatchObject({ nothingInIt: false, netGrams: 6, uncertaintyGrams: 5 })
  })

  it('has a net of nothing just below its tare, within the accuracy of the scale', () => {
    // At 11.941 kg half a percent is 59.7 g, rounded up to 60.
    expect(contentsAfter(...full, weighed(11.941))).toMatchObject({ netGrams: 0, refrigerant: 'R-22', nothingInIt: false })
    expect(lastFindings(...full, weighed(11.941))).toEqual([])
  })

  it('has an unknown net further below its tare, never a negative one, and is to be weighed again', () => {
    const story = [...full, weighed(11)]
    expect(contentsAfter(...story)).toMatchObject({ netGrams: null, basis: 'unknown', refrigerant: 'R-22' })
    expect(lastFindings(...story)).toEqual(['weigh-again'])
    expect(lastMovements(...story)).toEqual(['weighing R-22 -8000'])
    const shown = viewAfter(story)
    expect(codes(shown)).toContain('weight-not-known')
    expect(shown.capacity).toMatchObject({ roomGrams: null, stopWeightGrams: 28_000, missing: ['weight'] })
  })

  it('brings the whole net back as an opening once it is known again', () => {
    expect(lastMovements(...full, weighed(11), weighed(19))).toEqual(['opening R-22 7000'])
  })

  it('keeps the finding of a confirmed reading and says that it was confirmed', () => {
    const { steps } = folded(...full, weighed(11, { confirmed: ['weigh-again'] }))
    expect(steps.at(-1)?.findings[0]?.code).toBe('weigh-again')
    expect(steps.at(-1)?.findings[0]?.text).toContain('confirmed')
  })

  it('holds something unknown when it was empty and weighs more than its tare', () => {
    const story = [registered(), weighed(13)]
    expect(contentsAfter(...story)).toMatchObject({ nothingInIt: false, evacuated: false, refrigerant: null, condition: 'unknown', netGrams: 1000 })
    expect(lastMovements(...story)).toEqual(['weighing ? 1000'])
    expect(viewAfter(story).capacity.missing).toEqual(['refrigerant'])
  })

  it('is to be weighed again above what it could hold of a cold liquid, and the reading stands', () => {
    // 20 kg of water are 20.0192 L; R-22 at -40 C weighs 1.4068 kg/L: 28.163 kg.
    expect(lastFindings(...full, weighed(40.16))).not.toContain('weigh-again')
    expect(lastFindings(...full, weighed(40.17))).toContain('weigh-again')
    expect(contentsAfter(...full, weighed(40.17)).netGrams).toBe(28_170)
  })

  it('is to be weighed again above one and a half times its water where nobody knows the gas', () => {
    const unknown = registered({ contents: 'unknown' })
    expect(lastFindings(unknown, weighed(42))).not.toContain('weigh-again')
    expect(lastFindings(unknown, weighed(42.01))).toContain('weigh-again')
  })

  it('has no net without a tare', () => {
    const story = [registered({ stamp: { ...STAMP, tareWeight: null } }), weighed(12)]
    expect(contentsAfter(...story)).toMatchObject({ netGrams: null, nothingInIt: true })
  })
})
