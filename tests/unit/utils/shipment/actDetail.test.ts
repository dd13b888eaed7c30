import { expect, it } from 'vitest'
import { actDetail } from '../../../../utils/shipment/actDetail'

it('the history says what was changed in a settlement, and how a dispute ended', () => {
  const net = { cylinderId: 'a', field: 'acceptedNet', from: null, to: { unit: 'lb', value: 11 } }
  expect(actDetail({ details: { changes: [net, { cylinderId: 'a', field: 'grade', from: 'A', to: null }] } })).toBe('accepted net 11.0\u00A0lb, grade left out, before A')
  expect(actDetail({ details: { changes: [net, { ...net, cylinderId: 'b' }] } })).toBe('2 figures of 2 lines')
  expect(actDetail({ details: { changes: [] } })).toBeNull()
  expect(actDetail({ details: { outcome: 'agreed', text: 'Weighed again.' } })).toBe('Weighed again., Agreed on something between')
})
