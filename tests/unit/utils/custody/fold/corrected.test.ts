import { describe, expect, it } from 'vitest'
import {
  contentsAfter, corrected, did, filled, folded, HOUR, idOf, kg, lastMovements, registered, START, viewAfter, weighed, STAMP,
} from '~~/tests/helpers/custody'

const story = [registered(), filled('R-22', 20), weighed(19)]
const WEIGHING = idOf(2)

describe('a correction', () => {
  it('takes an event out: what it did is undone, its line stays and says why', () => {
    const { state, steps } = folded(...story, corrected(WEIGHING))
    expect(state.contents.netGrams).toBe(8000)
    expect(steps[2]).toMatchObject({
      eventId: WEIGHING, findings: [], movements: [], correction: { eventId: idOf(3), reason: 'a slip of the pen', takenOut: true },
    })
  })

  it('puts other details in the event\'s place, at the event\'s time', () => {
    const { state, steps, movements } = folded(...story, weighed(18), corrected(WEIGHING, { gross: kg(19.5) }))
    expect(state.contents.netGrams).toBe(6000)
    expect(steps[2]).toMatchObject({ after: { netGrams: 7500 }, correction: { takenOut: false } })
    expect(movements.map(({ grams }) => grams)).toEqual([8000, -500, -1500])
  })

  it('counts as the latest in effect of several', () => {
    const first = corrected(WEIGHING, { gross: kg(19.5) })
    const second = corrected(WEIGHING)
    expect(contentsAfter(...story, first, second).netGrams).toBe(8000)
    expect(contentsAfter(...story, second, first).netGrams).toBe(7500)
    expect(contentsAfter(...story, { ...second, more: { occurredAt: START + 5 * HOUR } }, { ...first, more: { occurredAt: START + 4 * HOUR } }).netGrams).toBe(8000)
  })

  it('may itself be taken out or replaced', () => {
    expect(contentsAfter(...story, corrected(WEIGHING), corrected(idOf(3))).netGrams).toBe(7000)
    const other = { eventId: WEIGHING, reason: 'read again', instead: { gross: kg(19.2) } }
    expect(contentsAfter(...story, corrected(WEIGHING), corrected(idOf(3), other)).netGrams).toBe(7200)
    expect(contentsAfter(...story, corrected(WEIGHING), corrected(idOf(3)), corrected(idOf(4))).netGrams).toBe(8000)
  })

  it('may itself be pointed at another event or at another correction', () => {
    // The weighing was taken out by a slip; it is the fill that was meant, so 19 kg is all that the scale ever showed.
    const meantFill = corrected(idOf(3), { eventId: idOf(1), reason: 'the wrong line' })
    expect(contentsAfter(...story, corrected(WEIGHING), meantFill)).toMatchObject({ netGrams: 7000, refrigerant: null })
    // The second correction named the registration, which stands; it is the first one that was meant, so the fill counts again.
    const meantFirst = corrected(idOf(4), { eventId: idOf(3), reason: 'the wrong line' })
    expect(contentsAfter(...story, corrected(idOf(1)), corrected(idOf(0)), meantFirst)).toMatchObject({ netGrams: 7000, refrigerant: 'R-22' })
  })

  it('that corrects another in a circle still ends', () => {
    const circle = [...story, corrected(idOf(4)), corrected(idOf(3))]
    expect(contentsAfter(...circle).netGrams).toBe(7000)
  })

  it('does nothing before its event arrives, nor where its details do not fit', () => {
    expect(contentsAfter(...story, corrected(idOf(99))).netGrams).toBe(7000)
    expect(contentsAfter(...story, corrected(WEIGHING, { toPlaceId: 'nowhere' })).netGrams).toBe(7000)
    expect(contentsAfter(...story, corrected(WEIGHING, { gross: { unit: 'kg', value: -1 } })).netGrams).toBe(7000)
  })

  it('replaces a registration but never takes it out', () => {
    expect(viewAfter([...story, corrected(idOf(0))]).stamp?.serial).toBe('A1001')
    const right = { stamp: { ...STAMP, tareWeight: kg(11) }, ownership: 'own', contents: 'evacuated' }
    expect(viewAfter([...story, corrected(idOf(0), right)])).toMatchObject({ stamp: { tareWeightGrams: 11_000 }, contents: { netGrams: 8000 } })
  })

  it('of a fill that was a mistake lifts the stop that it raised', () => {
    const mixed = [...story, filled('R-134a', 21)]
    expect(viewAfter([...mixed, corrected(idOf(3))])).toMatchObject({ contents: { refrigerant: 'R-22', condition: 'clean' }, findings: [] })
  })

  it('changes what a later event in effect did', () => {
    const drawnAfter = [...story, did('drawn', { grossAfter: kg(18), purpose: 'same-system' }), corrected(WEIGHING, { gross: kg(19.5) })]
    const { movements } = folded(...drawnAfter)
    expect(movements.find(({ cause }) => cause === 'drawn-same-system')?.grams).toBe(-1500)
    expect(lastMovements(...drawnAfter)).toEqual([])
  })
})
