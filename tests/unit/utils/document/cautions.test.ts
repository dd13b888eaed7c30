import { expect, it } from 'vitest'
import { cautionsFor } from '../../../../utils/document/cautions'

it('warns against opening a cylinder of unknown contents', () => {
  expect(cautionsFor(['unknown-contents'])[0]).toContain('Do not open the valve')
})

it('says each caution once where topics share it', () => {
  const cautions = cautionsFor(['handling', 'handling', 'moving'])
  expect(cautions).toHaveLength(5)
})

it('says of two that begin alike the one that says more', () => {
  const protection = cautionsFor(['filling', 'handling']).filter(caution => caution.startsWith('Wear eye and hand protection'))
  expect(protection).toEqual(['Wear eye and hand protection: escaping liquid freezes skin and eyes.'])
  expect(cautionsFor(['handling'])[0]).toBe('Wear eye and hand protection.')
})
