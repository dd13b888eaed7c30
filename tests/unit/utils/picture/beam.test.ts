import { describe, expect, it } from 'vitest'
import { beamText, layOutBeam } from '../../../../utils/picture/beam'

// A cylinder of 10 kg that takes 8 kg and would hold 10 kg of water.
const HALF_WAY = { tareGrams: 10_000, nowGrams: 16_000, stopGrams: 18_000, waterFullGrams: 20_000 }

describe('the beam', () => {
  it('runs from the empty cylinder to the water-full one', () => {
    const beam = layOutBeam(HALF_WAY, 'kg')
    expect(beam).toMatchObject({ now: 60, stop: 80, filled: 60, over: 0 })
  })

  it('stands at the left end while the cylinder is empty', () => {
    expect(layOutBeam({ ...HALF_WAY, nowGrams: 10_000 }, 'kg')).toMatchObject({ now: 0, filled: 0, over: 0 })
  })

  it('has no excess at the stop weight and some from the next gram on', () => {
    expect(layOutBeam({ ...HALF_WAY, nowGrams: 18_000 }, 'kg').over).toBe(0)
    expect(layOutBeam({ ...HALF_WAY, nowGrams: 18_001 }, 'kg').over).toBeCloseTo(0.01)
  })

  it('draws an excess past the stop, even past water-full', () => {
    const beam = layOutBeam({ ...HALF_WAY, nowGrams: 26_000 }, 'kg')
    expect(beam).toMatchObject({ now: 100, stop: 50, filled: 50, over: 50 })
  })

  it('keeps a weighing below tare at the left end', () => {
    expect(layOutBeam({ ...HALF_WAY, nowGrams: 9_000 }, 'kg')).toMatchObject({ now: 0, filled: 0 })
  })

  it('writes no number of the scale under the poise or the flag', () => {
    const beam = layOutBeam(HALF_WAY, 'kg')
    expect(beam.ticks.filter(tick => tick.size === 'major').map(tick => tick.at)).toEqual([0, 20, 40, 60, 80, 100])
    expect(beam.ticks.flatMap(tick => tick.label ?? [])).toEqual(['12', '14'])
  })

  it('lifts the figure of the stop where the poise would hide it', () => {
    expect(layOutBeam(HALF_WAY, 'kg').stopLabelAbove).toBe(false)
    expect(layOutBeam({ ...HALF_WAY, nowGrams: 17_500 }, 'kg').stopLabelAbove).toBe(true)
  })

  it('gives up the tare’s words where the reading stands over them', () => {
    expect(layOutBeam(HALF_WAY, 'kg').tareLabel).toBe('10.00 tare')
    expect(layOutBeam({ ...HALF_WAY, nowGrams: 11_000 }, 'kg').tareLabel).toBeNull()
  })

  // 66.06 lb, the stop of a 27.9 lb cylinder that may take 38.16 lb.
  it('rounds the stop weight down and the reading to the nearest', () => {
    const beam = layOutBeam({ tareGrams: 12_655, nowGrams: 22_933, stopGrams: 29_964, waterFullGrams: 34_292 }, 'lb')
    expect(beam.stopLabel).toBe('66.0')
    expect(beam.nowLabel).toBe('50.6 now')
  })

  it('says the same numbers in words', () => {
    expect(beamText(HALF_WAY, 'kg')).toBe(
      'On the scale: tare 10.00\u00A0kg, now 16.00\u00A0kg, stop at 18.00\u00A0kg, full of water 20.00\u00A0kg')
  })

  it('says by how much the stop is passed, rounded up', () => {
    expect(beamText({ ...HALF_WAY, nowGrams: 18_202 }, 'kg')).toContain('now 18.20\u00A0kg, 0.21\u00A0kg above the stop')
  })
})
