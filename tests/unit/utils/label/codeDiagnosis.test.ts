import { describe, expect, it } from 'vitest'
import { codeDiagnosis } from '../../../../utils/label/codeDiagnosis'

function likelyGroups(text: string): number[] {
  const diagnosis = codeDiagnosis(text)
  return 'groups' in diagnosis ? diagnosis.groups.filter(group => group.likely).map(group => group.place) : []
}

describe('typing a label code', () => {
  it('says how many characters are missing, up to the last', () => {
    expect(codeDiagnosis('')).toEqual({ state: 'typing', missing: 9 })
    expect(codeDiagnosis('7k3 m9q 2t')).toEqual({ state: 'typing', missing: 1 })
  })

  it('knows the whole code with the ninth', () => {
    expect(codeDiagnosis('7k3 m9q 2tx')).toEqual({ state: 'whole', code: '7K3M9Q2TX' })
  })

  it('says how many are too many', () => {
    expect(codeDiagnosis('7k3 m9q 2tx 1')).toEqual({ state: 'too-many', extra: 1 })
  })

  it('points at a character that is on no label', () => {
    expect(codeDiagnosis('7k3 mu')).toEqual({
      state: 'strange-characters',
      characters: ['U'],
      groups: [{ place: 1, text: '7K3', likely: false }, { place: 2, text: 'MU', likely: true }],
    })
  })

  it('asks to compare the group with a look-alike that would explain the check, and offers the code meant', () => {
    const diagnosis = codeDiagnosis('7K8 M9Q 2TX')
    expect(diagnosis).toMatchObject({ state: 'compare', nearCodes: expect.arrayContaining(['7K3M9Q2TX']) })
    expect(likelyGroups('7K8 M9Q 2TX')).toContain(1)
  })

  it('asks to compare both groups where neighbours of two were swapped', () => {
    expect(codeDiagnosis('7KM 39Q 2TX')).toMatchObject({ state: 'compare', nearCodes: expect.arrayContaining(['7K3M9Q2TX']) })
    expect(likelyGroups('7KM 39Q 2TX')).toEqual(expect.arrayContaining([1, 2]))
  })

  it('names all three groups as they were typed', () => {
    expect(codeDiagnosis('7k3m9q2ty')).toMatchObject({ state: 'compare', groups: [{ text: '7K3' }, { text: 'M9Q' }, { text: '2TY' }] })
  })
})
