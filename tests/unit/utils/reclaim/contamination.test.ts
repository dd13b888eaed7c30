import { describe, expect, it } from 'vitest'
import { corrected, did, filled, idOf, kg, OTHER_CYLINDER, recorded, registered } from '~~/tests/helpers/custody'
import { contaminationPercent } from '~~/utils/reclaim/contamination'

const TRANSFER = '0198f000-0000-7000-8000-0000000000d1'
const analysed = (composition: { component: string, massPercent: number }[], refrigerant: string | null = 'R-22') =>
  did('checked', { method: 'identifier', composition, verdict: { refrigerant, condition: 'suspect' } })
const found = analysed([{ component: 'R-22', massPercent: 95.4 }, { component: 'r-12', massPercent: 3.2 }, { component: 'air', massPercent: 1.4 }])
const start = [registered(), filled('R-22', 20)]

describe('how much of other refrigerants a cylinder holds', () => {
  it('is what its last analysis says, and air is no refrigerant', () => {
    expect(contaminationPercent(recorded(...start, found))).toBe(3.2)
    expect(contaminationPercent(recorded(...start, found, analysed([{ component: 'R-22', massPercent: 99 }, { component: 'R-12', massPercent: 1 }])))).toBe(1)
  })

  it('goes up to a tenth, and no further for how the parts add up', () => {
    const others = (...massPercents: number[]) => contaminationPercent(recorded(...start, analysed([{ component: 'R-22', massPercent: 97 }, ...massPercents.map((massPercent, index) => ({ component: `R-1${index}`, massPercent }))])))
    expect(others(2.04)).toBe(2.1)
    expect(others(2)).toBe(2)
    // 0.1 + 0.2 is a little more than 0.3 in binary.
    expect(others(0.1, 0.2)).toBe(0.3)
  })

  it('is not known without an analysis, nor once something was put in after it', () => {
    expect(contaminationPercent(recorded(...start))).toBeNull()
    expect(contaminationPercent(recorded(...start, did('checked', { method: 'identifier', verdict: { refrigerant: 'R-22', condition: 'clean' } })))).toBeNull()
    expect(contaminationPercent(recorded(...start, found, filled('R-22', 21)))).toBeNull()
    const moved = (direction: 'in' | 'out') => did('transferred', { direction, counterpartId: OTHER_CYLINDER, transferId: TRANSFER, refrigerant: 'R-22', condition: 'clean', grossAfter: kg(19) })
    expect(contaminationPercent(recorded(...start, found, moved('in')))).toBeNull()
    expect(contaminationPercent(recorded(...start, found, moved('out')))).toBe(3.2)
  })

  it('is not that of an analysis that was taken out again', () => {
    expect(contaminationPercent(recorded(...start, found, corrected(idOf(2))))).toBeNull()
  })

  it('of what nobody could name is all but the most of it', () => {
    expect(contaminationPercent(recorded(...start, analysed([{ component: 'R-22', massPercent: 30 }, { component: 'R-134a', massPercent: 60 }, { component: 'R-12', massPercent: 10 }], null)))).toBe(40)
  })

  it('is not known where a blend is told by its parts', () => {
    expect(contaminationPercent(recorded(...start, analysed([{ component: 'R-32', massPercent: 50 }, { component: 'R-125', massPercent: 50 }], 'R-410A')))).toBeNull()
  })
})
