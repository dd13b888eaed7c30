import { describe, expect, it } from 'vitest'
import { roomAboard, roomInWords } from '../../../../utils/transport/roomAboard'

type Row = Parameters<typeof roomAboard>[0][number]

function aboard(change: Partial<Row>): Row {
  return { refrigerant: 'R-22', condition: 'clean', nothingInIt: false, roomGrams: 5_000, worstFinding: null, findingCodes: [], ...change }
}

describe('the room aboard a van', () => {
  it('is added up by refrigerant, and a burnt charge apart from a clean one', () => {
    expect(roomAboard([
      aboard({}), aboard({ roomGrams: 1_200 }), aboard({ condition: 'burnt', roomGrams: 800 }), aboard({ refrigerant: 'R-410A', roomGrams: 9_000 }),
    ]).sums).toEqual([
      { refrigerant: 'R-410A', condition: 'clean', roomGrams: 9_000, withRoom: 1, notKnown: 0 },
      { refrigerant: 'R-22', condition: 'clean', roomGrams: 6_200, withRoom: 2, notKnown: 0 },
      { refrigerant: 'R-22', condition: 'burnt', roomGrams: 800, withRoom: 1, notKnown: 0 },
    ])
  })

  it('keeps a full cylinder, which has none, from one whose room is not known', () => {
    expect(roomAboard([aboard({ roomGrams: 0 }), aboard({ roomGrams: null })]).sums).toEqual([
      { refrigerant: 'R-22', condition: 'clean', roomGrams: 0, withRoom: 1, notKnown: 1 },
    ])
    expect(roomAboard([aboard({ roomGrams: null })]).sums[0]).toMatchObject({ roomGrams: null, withRoom: 0, notKnown: 1 })
  })

  it('counts none of what may not be filled, nor guesses at what goes into an empty one', () => {
    expect(roomAboard([
      aboard({ worstFinding: { code: 'wet', severity: 'stop' }, findingCodes: ['wet'] }),
      aboard({ worstFinding: { code: 'retest-overdue', severity: 'caution' }, findingCodes: ['retest-overdue'], roomGrams: null }),
      aboard({ refrigerant: null, nothingInIt: true, roomGrams: null }),
      aboard({ refrigerant: null, condition: 'unknown', roomGrams: null }),
      aboard({ worstFinding: { code: 'nearly-full', severity: 'caution' }, findingCodes: ['nearly-full'], roomGrams: 100 }),
    ])).toEqual({
      sums: [{ refrigerant: 'R-22', condition: 'clean', roomGrams: 100, withRoom: 1, notKnown: 0 }],
      empty: 1, unknown: 1, barred: 2,
    })
  })

  it('is said rounded down, and with what is not known of it', () => {
    // 5,000 g are 11.02 lb.
    expect(roomInWords(roomAboard([
      aboard({}), aboard({ roomGrams: null }), aboard({ refrigerant: 'R-32', roomGrams: null }), aboard({ refrigerant: null, nothingInIt: true, roomGrams: null }),
    ]), 'lb')).toEqual([
      { term: 'R-22, in 1 cylinder, 1 more not known', value: '11.0\u00A0lb', reason: 'not known of 1 cylinder', figure: true },
      { term: 'R-32', value: null, reason: 'not known of 1 cylinder', figure: true },
      { term: 'Nothing in 1 cylinder', value: 'by what goes in first' },
    ])
  })
})
