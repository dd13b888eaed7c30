import { expect, it } from 'vitest'
import { codeOrSerial } from '../../../../utils/label/codeOrSerial'

it('calls a cylinder by its label, else by its stamp, and says where it has neither', () => {
  expect(codeOrSerial({ labelCode: '7K3M9Q2TX', serial: 'K48213' })).toBe('7K3 M9Q 2TX')
  expect(codeOrSerial({ labelCode: null, serial: 'K48213' })).toBe('SN K48213')
  expect(codeOrSerial({ labelCode: null, serial: null })).toBe('SN –')
})
