import { describe, expect, it } from 'vitest'
import { nextStep } from '../../../../utils/fleet/nextStep'
import { cylinderRow } from '../../../helpers/cylinderRow'

describe('what to do with a cylinder next', () => {
  it('is to draw down one that is overfilled, whatever else it needs', () => {
    expect(nextStep(cylinderRow({ findingCodes: ['overfill', 'retest-overdue'] }))?.word).toBe('Draw it down')
  })

  it('is to look for one that is missing, though it is overfilled: nobody draws down what nobody has', () => {
    expect(nextStep(cylinderRow({ lifecycle: 'missing', findingCodes: ['overfill'] }))?.word).toBe('Look for it')
    expect(nextStep(cylinderRow({ lifecycle: 'retired', findingCodes: ['overfill'] }))).toBeNull()
  })

  it('is never to test a cylinder with something in it', () => {
    expect(nextStep(cylinderRow({ findingCodes: ['retest-overdue'] }))).toEqual({ word: 'Empty or ship it', screen: 'shipment' })
    expect(nextStep(cylinderRow({ findingCodes: ['retest-overdue'], nothingInIt: true, refrigerant: null }))).toEqual({ word: 'Send to test', screen: 'test-lot' })
    for (const code of ['early-test', 'retest-unknown'] as const) {
      expect(nextStep(cylinderRow({ findingCodes: [code] }))?.word).toBe('Empty or ship it')
      expect(nextStep(cylinderRow({ findingCodes: [code], nothingInIt: true, refrigerant: null }))?.word).toBe('Send to test')
    }
  })

  it('is to plan the test of an empty one that falls due soon, and to go on using a filled one', () => {
    expect(nextStep(cylinderRow({ findingCodes: ['retest-soon'], nothingInIt: true, refrigerant: null }))).toEqual({ word: 'Plan its test', screen: 'test-lot' })
    expect(nextStep(cylinderRow({ findingCodes: ['retest-soon'] }))?.screen).not.toBe('test-lot')
  })

  it('is to weigh what was not weighed and to identify what is not known', () => {
    expect(nextStep(cylinderRow({ netGrams: null }))?.word).toBe('Weigh it')
    expect(nextStep(cylinderRow({ refrigerant: null }))?.word).toBe('Identify it')
  })

  it('is to evacuate what came back wet from its test', () => {
    expect(nextStep(cylinderRow({ nothingInIt: true, refrigerant: null, findingCodes: ['wet'], worstFinding: { code: 'wet', severity: 'stop' } }))?.word).toBe('Evacuate it')
  })

  it('is to ship what belongs to two owners, and never to fill it up', () => {
    expect(nextStep(cylinderRow({ findingCodes: ['two-owners'] }))).toEqual({ word: 'Ship it', screen: 'shipment' })
  })

  it('is to empty what is condemned and then to take it out of use: as it is, it cannot be shipped', () => {
    expect(nextStep(cylinderRow({ lifecycle: 'condemned' }))?.word).toBe('Empty it')
    expect(nextStep(cylinderRow({ lifecycle: 'condemned', nothingInIt: true, refrigerant: null }))).toEqual({ word: 'Take it out of use', screen: 'cylinder' })
  })

  it('is nothing where its life has ended, unless it was used after that', () => {
    expect(nextStep(cylinderRow({ lifecycle: 'retired' }))).toBeNull()
    expect(nextStep(cylinderRow({ lifecycle: 'retired', findingCodes: ['after-end'] }))).toEqual({ word: 'See why', screen: 'cylinder' })
  })
})
