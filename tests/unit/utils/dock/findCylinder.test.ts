import { describe, expect, it } from 'vitest'
import { cylindersMeant } from '../../../../utils/dock/findCylinder'

const [LABELLED, K4821, B94821, BARE] = [
  { labelCode: '7K3M9Q2TX', serial: 'K-100' }, { labelCode: null, serial: 'K-4821' }, { labelCode: null, serial: 'B 94821' }, { labelCode: null, serial: null },
]
const ALL = [LABELLED, K4821, B94821, BARE]

describe('the cylinder that a person at the dock means', () => {
  it('is found by the code on its label, as it is typed', () => {
    expect(cylindersMeant(ALL, '7k3 m9q 2tx')).toEqual([LABELLED])
  })

  it('is found by its serial, whatever signs are in it', () => {
    expect(cylindersMeant(ALL, 'k4821')).toEqual([K4821])
    expect(cylindersMeant(ALL, 'B-94821')).toEqual([B94821])
  })

  it('is found by three or more last characters, and by two not at all', () => {
    expect(cylindersMeant(ALL, '821')).toEqual([K4821, B94821])
    expect(cylindersMeant(ALL, '94821')).toEqual([B94821])
    expect(cylindersMeant(ALL, '2TX')).toEqual([LABELLED])
    expect(cylindersMeant(ALL, '21')).toEqual([])
  })

  it('is none where nothing is typed but signs', () => {
    expect(cylindersMeant(ALL, ' - ')).toEqual([])
    expect(cylindersMeant(ALL, '')).toEqual([])
  })
})
