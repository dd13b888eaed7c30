import { describe, expect, it } from 'vitest'
import { corrected, did, filled, FOLD_CONTEXT, idOf, kg, recorded, registered, VAN, weighed, type Told } from '~~/tests/helpers/custody'
import { asRecorded } from '~~/utils/custody/asRecorded'
import { fold } from '~~/utils/custody/fold'

const nets = (...story: Told[]) => asRecorded(recorded(...story), FOLD_CONTEXT).map(({ before, after }) => [before.netGrams, after.netGrams])

describe('a custody log as it was recorded', () => {
  it('has the difference that a correction made on the line of the correction', () => {
    expect(nets(
      registered({ gross: kg(12) }), filled('R-22', 20), did('moved', { toPlaceId: VAN }), corrected(idOf(1), { refrigerant: 'R-22', grossAfter: kg(19), looked: true }), weighed(18.5),
    )).toEqual([[null, 0], [0, 8_000], [8_000, 8_000], [8_000, 7_000], [7_000, 6_500]])
  })

  it('gives back on a second correction what the first took', () => {
    expect(nets(registered({ gross: kg(12) }), filled('R-22', 20), corrected(idOf(1)), corrected(idOf(2)))).toEqual([[null, 0], [0, 8_000], [8_000, 0], [0, 8_000]])
  })

  it('ends as the log now stands, and is the fold itself where nothing was corrected', () => {
    const plain = recorded(registered({ gross: kg(12) }), filled('R-22', 20), weighed(19))
    expect(asRecorded(plain, FOLD_CONTEXT)).toEqual(fold(plain, FOLD_CONTEXT).steps)
    const mended = recorded(registered({ gross: kg(12) }), filled('R-22', 20), corrected(idOf(1)), did('moved', { toPlaceId: VAN }))
    expect(asRecorded(mended, FOLD_CONTEXT).at(-1)!.after).toEqual(fold(mended, FOLD_CONTEXT).steps.at(-1)!.after)
  })
})
