import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import VanNoneScanned from '~~/components/van/VanNoneScanned.vue'

const mount = (expected: number) => mountSuspended(VanNoneScanned, { props: { modelValue: true, vanName: 'Van 12', expected, busy: false } })

function press(dialog: Awaited<ReturnType<typeof mount>>, text: string) {
  return dialog.findAll('button').find(button => button.text() === text)!.trigger('click')
}

describe('a van of which nothing was scanned', () => {
  it('is checked in only once the person has read how many are then to look for', async () => {
    const dialog = await mount(11)
    expect(dialog.text()).toContain('None of the 11 expected was scanned')
    expect(dialog.text()).toContain('Van 12 then came back with none of what it should hold, and all 11 are to look for.')
    await press(dialog, 'Check in without 11')
    expect(dialog.emitted('confirm')).toHaveLength(1)
  })

  it('is left as it was by whoever scans first', async () => {
    const dialog = await mount(1)
    expect(dialog.text()).toContain('The one expected was not scanned')
    await press(dialog, 'Scan first')
    expect(dialog.emitted('confirm')).toBeUndefined()
    expect(dialog.emitted('update:modelValue')).toEqual([[false]])
  })
})
