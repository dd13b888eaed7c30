import { describe, expect, it } from 'vitest'
import { fold } from '../../../../utils/custody/fold'
import { view } from '../../../../utils/custody/view'
import { takenLine } from '../../../../utils/handover/takenLine'
import { did, filled, FOLD_CONTEXT, recorded, registered, TECHNICIAN, VIEW_CONTEXT, type Told } from '../../../helpers/custody'

const GIVER = TECHNICIAN
const TAKER = '01900000-0000-7000-8000-0000000000aa'
const lineOf = (...story: Told[]) => takenLine({ reference: 'x', view: view(fold(recorded(...story), FOLD_CONTEXT).state, VIEW_CONTEXT), problem: null }, GIVER, TAKER)
const inHands = (toHolderId: string) => did('handed-over', { toHolderId })

describe('a cylinder that is handed over', () => {
  it('is taken from whoever has it, without a word', () => {
    expect(lineOf(registered(), inHands(GIVER))).toMatchObject({ canTake: true, notes: [] })
  })

  it('is taken all the same where this phone knows another holder or none, and that is said', () => {
    expect(lineOf(registered())).toMatchObject({ canTake: true, notes: ['As far as this phone knows nobody holds it; it stands at its place.'] })
    expect(lineOf(registered(), inHands('01900000-0000-7000-8000-0000000000bb')).notes[0]).toMatch(/ holds it\.$/)
  })

  it('is not taken twice', () => {
    expect(lineOf(registered(), inHands(TAKER))).toMatchObject({ canTake: false, notes: ['You hold it already.'] })
  })

  it('hides nothing that is found', () => {
    expect(lineOf(registered(), filled('R-22', 45), inHands(GIVER)).findings.map(({ code }) => code)).toContain('overfill')
  })

  it('is told where this phone does not know it, and why', () => {
    expect(takenLine({ reference: '7K3M9Q2TX', view: null, problem: null }, GIVER, TAKER)).toEqual({
      canTake: false, notes: ['This phone’s copy does not have it. Take it once there is signal.'], findings: [],
    })
    expect(takenLine({ reference: '7K3M9Q2TX', view: null, problem: 'No connection' }, GIVER, TAKER).notes).toEqual(['No connection'])
  })
})
