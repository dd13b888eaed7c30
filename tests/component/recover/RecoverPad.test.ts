import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import RecoverFilling from '~~/components/recover/RecoverFilling.vue'
import RecoverPad from '~~/components/recover/RecoverPad.vue'
import { allByRole, byRole } from '../../helpers/roles'

const PAD = { unit: 'lb' as const, label: 'Scale reads now', verb: 'Note' }

const press = (key: string, target: EventTarget = window) => target.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }))

describe('the number pad', () => {
  it('has keys and no field, and gives the reading that its button names', async () => {
    const pad = await mountSuspended(RecoverPad, { props: PAD })
    expect(pad.findAll('input, textarea, select')).toHaveLength(0)
    for (const name of ['6', '2', 'Decimal point', '3']) await pad.findAll('button').find(key => (key.attributes('aria-label') ?? key.text()) === name)!.trigger('click')
    const note = pad.findAll('button').find(key => key.text().replaceAll('\u00A0', ' ') === 'Note 62.3 lb')!
    await note.trigger('click')
    expect(pad.emitted('reading')).toEqual([[{ unit: 'lb', value: 62.3 }]])
    await note.trigger('click')
    expect(byRole(pad.element, 'alert').textContent).toContain('The weight is not typed yet.')
    expect(pad.emitted('reading')).toHaveLength(1)
    pad.unmount()
  })

  it('is typed on by a keyboard, and leaves what is typed into a field to the field', async () => {
    const pad = await mountSuspended(RecoverPad, { props: { ...PAD, unit: 'kg' as const } })
    const field = document.body.appendChild(document.createElement('input'))
    press('9', field)
    for (const key of ['2', '8', '.', '5', '9', 'Backspace', '2', 'Enter']) press(key)
    expect(pad.emitted('reading')).toEqual([[{ unit: 'kg', value: 28.52 }]])
    field.remove()
    pad.unmount()
  })

  it('empties itself where the unit changes: no reading changes its unit by itself', async () => {
    const pad = await mountSuspended(RecoverPad, { props: PAD })
    press('6')
    await pad.setProps({ unit: 'kg' })
    press('7')
    press('Enter')
    expect(pad.emitted('reading')).toEqual([[{ unit: 'kg', value: 7 }]])
    pad.unmount()
  })
})

describe('filling beside the scale', () => {
  // TW 27.9 lb, limit 38.16 lb: stop at 66.06 lb, 29964.3 g.
  const plan = { refrigerant: 'R-410A', stopGrams: 29964.3, tareGrams: 12655, limitGrams: 17309, waterFullGrams: 34291, rule: 'water weight', at: '' }
  const props = {
    plan, unit: 'lb' as const, last: { unit: 'lb' as const, value: 66.5 }, readings: 3, stage: 'past' as const,
    words: { head: '0.5 lb past the stop', line: 'It is overfilled.' }, mustStop: true, doubt: null, mayGoDark: true,
  }

  it('puts the stop in the place of the keys until somebody answers it', async () => {
    const filling = await mountSuspended(RecoverFilling, { props })
    expect(filling.text()).toContain('Past the stop weight: shut the valve now.')
    expect(filling.findComponent(RecoverPad).exists()).toBe(false)
    const [hoses, seen, undo] = allByRole(filling.element, 'button')
    for (const answer of [hoses, seen, undo]) (answer as HTMLElement).click()
    expect(['hoses', 'seen', 'undo'].map(name => filling.emitted(name)?.length)).toEqual([1, 1, 1])
    await filling.setProps({ mustStop: false })
    expect(filling.findComponent(RecoverPad).exists()).toBe(true)
    expect(filling.text()).toContain('3 readings, kept')
    expect(filling.text()).toContain('The screen may turn off by itself.')
  })

  it('asks about a doubtful reading, with the way back first', async () => {
    const gross = { unit: 'lb' as const, value: 49 }
    const filling = await mountSuspended(RecoverFilling, { props: { ...props, mustStop: false, doubt: { gross, text: 'Is it what the scale shows?' } } })
    expect(byRole(filling.element, 'alert').textContent).toContain('Is it what the scale shows?')
    const [no, yes] = allByRole(filling.element, 'button')
    ;(no as HTMLElement).click()
    ;(yes as HTMLElement).click()
    expect(filling.emitted('drop')).toHaveLength(1)
    expect(filling.emitted('take')).toEqual([[gross]])
  })
})
