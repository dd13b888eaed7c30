import { expect, it } from 'vitest'
import { cautionsFor } from '../../../../utils/document/cautions'

it('warns against opening a cylinder of unknown contents', () => {
  expect(cautionsFor(['unknown-contents'])[0]).toContain('Do not open the valve')
})

it('says each caution once where topics share it', () => {
  const cautions = cautionsFor(['handling', 'handling', 'moving'])
  expect(cautions).toHaveLength(5)
})
