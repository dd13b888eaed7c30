import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import FleetColumns from '~~/components/fleet/FleetColumns.vue'
import type { FleetLayout } from '~~/utils/contract/fleetLayout'

const LAYOUT: FleetLayout = { columns: ['code', 'verdict', 'room', 'stop'], density: 'compact' }

async function mount() {
  const wrapper = await mountSuspended(FleetColumns, { props: { layout: LAYOUT, modelValue: true } })
  const press = (name: string) => wrapper.findAll('button').find(button => (button.attributes('aria-label') ?? button.text()) === name)!
  const keep = async () => {
    await press('Keep this').trigger('click')
    return wrapper.emitted('keep')!.at(-1)
  }
  return { wrapper, press, keep }
}

describe('the choice of columns', () => {
  it('keeps what is shown as it is until something is changed', async () => {
    expect(await (await mount()).keep()).toEqual([LAYOUT])
  })

  it('takes a column off, and puts another behind the rest', async () => {
    const { wrapper, keep } = await mount()
    const box = (name: string) => wrapper.findAll('label').find(label => label.text() === name)!.find('input')
    await box('Room').setValue(false)
    await box('Serial').setValue(true)
    expect(await keep()).toEqual([{ columns: ['code', 'verdict', 'stop', 'serial'], density: 'compact' }])
  })

  it('moves a column by buttons, says where it came to, and stops at either end', async () => {
    const { wrapper, press, keep } = await mount()
    expect(press('Move Room earlier').attributes('disabled')).toBeDefined()
    expect(press('Move Stop later').attributes('disabled')).toBeDefined()
    await press('Move Stop earlier').trigger('click')
    expect(wrapper.find('[role=status]').text()).toBe('Stop is column 3 of 4.')
    expect(await keep()).toEqual([{ columns: ['code', 'verdict', 'stop', 'room'], density: 'compact' }])
  })

  it('lets neither code nor verdict go', async () => {
    const { wrapper, press } = await mount()
    const fixed = wrapper.findAll('input[type=checkbox]').slice(0, 2)
    expect(fixed.map(box => box.attributes('disabled'))).toEqual(['', ''])
    expect(press('Move Verdict later')).toBeUndefined()
  })

  it('sets the height of the rows', async () => {
    const { press, keep } = await mount()
    await press('Tall rows').trigger('click')
    expect(await keep()).toEqual([{ ...LAYOUT, density: 'comfortable' }])
  })
})
