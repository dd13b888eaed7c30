import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import ShipmentReturnForm from '~~/components/shipment/ShipmentReturnForm.vue'
import { allByRole, byRole } from '../../helpers/roles'
import { shipmentLine } from '../../helpers/shipmentLine'

const SENT = { gross: { unit: 'lb' as const, value: 50.1 }, grossGrams: 22_725, refrigerant: 'R-22', condition: 'clean', netGrams: 10_251 }

it('takes back only what was chosen, weighed, placed and given a reason, and offers none that is back already', async () => {
  const form = await mountSuspended(ShipmentReturnForm, {
    props: {
      unit: 'lb', places: [{ id: 'north', name: 'North shop' }],
      lines: [shipmentLine('a', '0YHP9KRRT', { sent: SENT }), shipmentLine('b', '7K3M9Q2TX', { sent: SENT }), shipmentLine('c', '4TR8W2HN6', { sent: SENT, returnedAt: '2026-05-09T10:00:00.000Z' })],
    },
    attachTo: document.body,
  })
  const submit = () => form.find('form').trigger('submit')
  const alert = () => byRole(form.element, 'alert').textContent!.trim()
  expect(allByRole(form.element, 'checkbox')).toHaveLength(2)
  await submit()
  expect(alert()).toBe('Choose the cylinders that came back.')
  await form.find('input[type=checkbox]').setValue(true)
  expect(alert()).toBe('1 of them is not weighed yet.')
  await form.find('input[inputmode=decimal]').setValue('49.9')
  expect(alert()).toBe('Say where they stand now.')
  await form.find('select:not([aria-label])').setValue('north')
  expect(alert()).toBe('Say why they came back.')
  expect(form.emitted('takeBack')).toBeUndefined()
  await form.findAll('input').at(-1)!.setValue('Refused at the dock')
  await submit()
  expect(form.emitted('takeBack')).toEqual([['north', 'Refused at the dock', [{ cylinderId: 'a', gross: { unit: 'lb', value: 49.9 } }]]])
  form.unmount()
})
