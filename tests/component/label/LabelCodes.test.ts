import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, describe, expect, it } from 'vitest'
import LabelBare from '~~/components/label/LabelBare.vue'
import LabelCodes from '~~/components/label/LabelCodes.vue'
import { byRole } from '../../helpers/roles'

let wrapper: Awaited<ReturnType<typeof mountSuspended>> | null = null
afterEach(() => wrapper?.unmount())

describe('which labels are to be printed', () => {
  async function shown(codes: string[] = []) {
    wrapper = await mountSuspended(LabelCodes, { props: { codes, proposed: '10', busy: false } })
    return wrapper
  }

  it('are listed by their codes, or said to be none yet', async () => {
    expect((await shown(['7K3M9Q2TX'])).find('ul[aria-label="Codes to be printed"]').text()).toBe('7K3 M9Q 2TX')
    wrapper!.unmount()
    expect((await shown()).text()).toContain('None yet.')
  })

  it('are all listed where they are more than one PDF takes, and go on with the rest once the first are printed', async () => {
    const codes = Array.from({ length: 101 }, (_, index) => `CODE${String(index).padStart(5, '0')}`)
    const card = await shown(codes.slice(0, 100))
    expect(card.text()).not.toContain('One PDF takes')
    await card.setProps({ codes })
    expect(card.text()).toContain('One PDF takes 100. 1 more waits for the next: COD E00 100')
    expect(card.findAll('ul[aria-label="Codes to be printed"] li')).toHaveLength(100)
    byRole(card.element, 'button', 'These are printed, go on with the last').click()
    expect(card.emitted('setAside')).toEqual([[codes.slice(0, 100)]])
  })

  it.each([['1', 1], ['100', 100]])('gains %s blank ones when that many are asked for', async (typed, count) => {
    const card = await shown()
    await card.find('input').setValue(typed)
    await card.find('form').trigger('submit')
    expect(card.emitted('mint')).toEqual([[count]])
  })

  it.each(['0', '101', '2.5', 'ten', ''])('gains none for “%s”, and says what may be written', async (typed) => {
    const card = await shown()
    await card.find('input').setValue(typed)
    await card.find('form').trigger('submit')
    expect(card.emitted('mint')).toBeUndefined()
    expect(card.text()).toContain('Write a number from 1 to 100.')
  })
})

describe('cylinders without a label', () => {
  it('are named by their serials, one that cannot be read too, and get their labels by one key', async () => {
    wrapper = await mountSuspended(LabelBare, { props: { serials: ['K48213', null], busy: false } })
    expect(wrapper.text()).toContain('2 cylinders have no label yet')
    expect(wrapper.text()).toContain('Serial K48213, not known.')
    await wrapper.find('button').trigger('click')
    expect(wrapper.emitted('give')).toHaveLength(1)
  })
})
