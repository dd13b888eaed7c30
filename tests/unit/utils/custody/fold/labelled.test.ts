import { describe, expect, it } from 'vitest'
import { codes, corrected, did, folded, idOf, kg, registered, REQUALIFIER, START, viewAfter, type Told } from '~~/tests/helpers/custody'

const OLD = '7K3M9Q2TX'
const NEW = '000000000'

describe('a labelled cylinder', () => {
  it('is called by its newest code, and still opens by the one it replaced', () => {
    const shown = viewAfter([registered(), did('labelled', { code: OLD }), did('labelled', { code: NEW, replaces: OLD })])
    expect(shown.labelCode).toBe(NEW)
    expect(shown.oldLabelCodes).toEqual([OLD])
    // Registered at the start, labelled an hour after it and again after another.
    expect(shown.labelledAt).toBe(new Date(START + 2 * 3_600_000).toISOString())
    expect(viewAfter([registered()]).labelledAt).toBeNull()
  })

  it('claims its codes from the instants they took effect, those taken out excepted', () => {
    const { labelClaims } = folded(registered(), did('labelled', { code: '7k3 m9q 2tx' }), did('labelled', { code: NEW }), corrected(idOf(2)))
    expect(labelClaims).toEqual([{ eventId: idOf(1), code: OLD, effectiveAt: START + 3_600_000, deviceId: 'phone-1', deviceSeq: 1 }])
  })

  it('is stopped where its code, even an old one, is on another cylinder', () => {
    const story = [registered(), did('labelled', { code: OLD }), did('labelled', { code: NEW })]
    expect(codes(viewAfter(story, { codesOnTwo: new Set([OLD]) }))).toEqual(['code-on-two'])
    expect(codes(viewAfter(story, { codesOnTwo: new Set(['7K3M9Q2T0']) }))).toEqual([])
  })

  it('knows which of its codes another has taken the place of, and that one stuck on again is on it', () => {
    const labels = (...story: Told[]) => folded(registered(), ...story).state.labels.map(({ code, replacedAt }) => [code, replacedAt ?? null])
    const [old, beside, instead, again] = [
      did('labelled', { code: OLD }), did('labelled', { code: NEW }), did('labelled', { code: NEW, replaces: '7k3 m9q 2tx' }), did('labelled', { code: OLD }),
    ]
    expect(labels(old, beside)).toEqual([[OLD, null], [NEW, null]])
    expect(labels(old, instead)).toEqual([[OLD, START + 2 * 3_600_000], [NEW, null]])
    expect(labels(old, instead, again)).toEqual([[OLD, null], [NEW, null]])
  })

  it('is to be labelled again after a retest has set a new tare', () => {
    const story = [registered(), did('labelled', { code: OLD }), did('retested', { month: '2026-07', method: 'visual', result: 'passed', requalifierId: REQUALIFIER, newTare: kg(11.9) })]
    expect(codes(viewAfter(story))).toEqual(['old-tare-on-label'])
    expect(codes(viewAfter([...story, did('labelled', { code: NEW, replaces: OLD })]))).toEqual([])
    expect(codes(viewAfter(story.toSpliced(1, 1)))).toEqual([])
  })
})
