import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import CylinderMarkEntry from '~~/components/cylinder/CylinderMarkEntry.vue'
import { EMPTY_MARK, type MarkEntry } from '~~/utils/requalification/markEntry'
import { allByRole, byRole } from '../../helpers/roles'

async function mount(entry: Partial<MarkEntry> = {}, props: { tried?: boolean, unmarked?: boolean, method?: 'volumetric' | 'proof' | 'visual' } = {}) {
  const wrapper = await mountSuspended(CylinderMarkEntry, {
    props: {
      ...props,
      'modelValue': { ...EMPTY_MARK, ...entry },
      'thisMonth': '2026-12',
      'onUpdate:modelValue': (next: MarkEntry) => wrapper.setProps({ modelValue: next }),
    },
    attachTo: document.body,
  })
  const drawn = () => allByRole(wrapper.element, 'img').map(picture => picture.getAttribute('aria-label')).filter(Boolean)
  return { wrapper, drawn, text: () => wrapper.text() }
}

describe('the fields of a retest mark', () => {
  it('draw the mark while it is typed, to hold against the steel', async () => {
    const { wrapper, drawn, text } = await mount()
    expect(drawn()).toEqual([])
    await wrapper.findAll('input')[0]!.setValue('9-06')
    expect(drawn()).toEqual(['Tested September 2006, RIN not noted, no suffix: volumetric expansion test'])
    await wrapper.findAll('input')[1]!.setValue('A123')
    await wrapper.findAll('input')[2]!.setValue('s')
    expect(drawn()).toEqual(['Tested September 2006 by RIN A123, suffix S: proof pressure test'])
    expect(text()).toContain('S: proof pressure test.')
    wrapper.unmount()
  })

  it('take the whole mark in the first', async () => {
    const { wrapper, drawn } = await mount({ month: '9 A1/32 06 E' })
    expect(drawn()).toEqual(['Tested September 2006 by RIN A123, suffix E: external visual inspection'])
    wrapper.unmount()
  })

  it('say what is wrong only once it was tried, and keep what was typed', async () => {
    const { wrapper, text } = await mount({ month: '9-06', rin: 'A12' })
    expect(text()).not.toContain('four letters or figures')
    await wrapper.setProps({ tried: true })
    expect(text()).toContain('A RIN has four letters or figures')
    expect(wrapper.findAll('input').map(input => input.element.value)).toEqual(['9-06', 'A12', ''])
    wrapper.unmount()
  })

  it('doubt a suffix that is none, or that does not fit the method, without refusing it', async () => {
    const strange = await mount({ month: '9 A123 06 V' })
    expect(byRole(strange.wrapper.element, 'status').textContent).toContain('No retest mark ends in V')
    strange.wrapper.unmount()
    const other = await mount({ month: '9 A123 06' }, { method: 'proof' })
    expect(byRole(other.wrapper.element, 'status').textContent).toContain('A proof pressure test is marked S')
    other.wrapper.unmount()
  })

  it('ask for the month alone where nothing is marked', async () => {
    const { wrapper, drawn } = await mount({ month: '9-06', rin: 'A123' }, { unmarked: true })
    expect(wrapper.findAll('input')).toHaveLength(1)
    expect(drawn()).toEqual([])
    wrapper.unmount()
  })
})
