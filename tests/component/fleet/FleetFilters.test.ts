import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import FleetFilters from '~~/components/fleet/FleetFilters.vue'
import { fleetQuery } from '~~/utils/contract/custody'
import { byRole } from '../../helpers/roles'

const NAMES = { places: [{ id: 'p1', name: 'Van 12' }], people: [{ id: 'h1', name: 'Mara' }], firms: [{ id: 'f1', name: 'Halden' }] }

function mount(query: Record<string, unknown> = {}) {
  return mountSuspended(FleetFilters, {
    props: { query: { ...fleetQuery.parse({}), ...query }, summary: null, names: NAMES, thisMonth: '2026-12' },
  })
}

describe('the filters of the fleet', () => {
  it.each([
    ['Place', 'p1', { place: 'p1' }], ['Stage of life', 'at-test', { lifecycle: 'at-test' }], ['Finding', 'wet', { finding: 'wet' }],
    ['Condition', 'burnt', { condition: 'burnt' }], ['Holder', 'h1', { holder: 'h1' }], ['Owner', 'f1', { owner: 'f1' }],
    ['Retest due', '2027-03', { dueBefore: '2027-03' }],
  ])('ask by %s in a list of their own', async (name, value, change) => {
    const wrapper = await mount()
    const labelled = wrapper.findAll('label').find(label => label.text() === name)?.attributes('for')
    await wrapper.find(labelled ? `select[id="${labelled}"]` : `select[aria-label="${name}"]`).setValue(value)
    expect(wrapper.emitted('change')).toEqual([[change]])
  })

  it('clear one that is set anew to nothing', async () => {
    const wrapper = await mount({ condition: 'burnt' })
    const id = wrapper.findAll('label').find(label => label.text() === 'Condition')!.attributes('for')
    await wrapper.find(`select[id="${id}"]`).setValue('')
    expect(wrapper.emitted('change')).toEqual([[{ condition: null }]])
  })

  it('ask for a label and for part of a text when they are sent', async () => {
    const wrapper = await mount()
    const [search, label] = wrapper.findAll('form')
    await search!.find('input').setValue('  K48 ')
    await search!.trigger('submit')
    await label!.find('input').setValue('7k3 m9q 2tx')
    await label!.trigger('submit')
    expect(wrapper.emitted('change')).toEqual([[{ q: 'K48' }], [{ label: '7k3 m9q 2tx' }]])
  })

  it('show all of the fleet as chosen only where none is set, and clear every one at once', async () => {
    const all = (wrapper: Awaited<ReturnType<typeof mount>>) => byRole(wrapper.element, 'button', 'All')
    expect(all(await mount()).getAttribute('aria-pressed')).toBe('true')
    const wrapper = await mount({ place: 'p1', refrigerant: 'R-22' })
    expect(all(wrapper).getAttribute('aria-pressed')).toBe('false')
    all(wrapper).click()
    expect(wrapper.emitted('change')).toEqual([[{
      q: null, place: null, holder: null, refrigerant: null, condition: null, lifecycle: null, dueBefore: null, finding: null, owner: null, label: null,
    }]])
  })

  it('name a month by the end of which the retest is due', async () => {
    const wrapper = await mount({ dueBefore: '2030-01' })
    const texts = wrapper.findAll('option').map(option => option.text())
    expect(texts).toContain('By the end of February 2027')
    expect(texts).toContain('By the end of December 2029')
  })

  it('stay in sight where one of them is set', async () => {
    expect((await mount()).find('#fleet-more-filters').attributes('style')).toContain('display: none')
    expect((await mount({ holder: 'h1' })).find('#fleet-more-filters').attributes('style') ?? '').not.toContain('display: none')
  })
})
