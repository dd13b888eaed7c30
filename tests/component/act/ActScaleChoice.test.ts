import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ActScaleChoice from '~~/components/act/ActScaleChoice.vue'
import { allByRole, byRole } from '../../helpers/roles'

const scale = (id: string, active = true) => ({ id, name: `Scale ${id}`, active })
const names = (root: Element) => allByRole(root, 'button').map(button => button.textContent?.trim())

describe('the scale of a weighing', () => {
  it('is chosen by one tap among those in use', async () => {
    const choice = await mountSuspended(ActScaleChoice, { props: { scales: [scale('a'), scale('b', false), scale('c')], modelValue: '' } })
    expect(names(choice.element)).toEqual(['Scale a', 'Scale c', 'Not named'])
    expect(choice.text()).toContain('usual accuracy')
    byRole(choice.element, 'button', 'Scale c').click()
    expect(choice.emitted('update:modelValue')).toEqual([['c']])
  })

  it('that an old line names stays to be seen when it is out of use', async () => {
    const choice = await mountSuspended(ActScaleChoice, { props: { scales: [scale('a'), scale('b', false)], modelValue: 'b' } })
    expect(byRole(choice.element, 'button', 'Scale b').getAttribute('aria-pressed')).toBe('true')
  })

  it('is chosen from a list where there are many', async () => {
    const choice = await mountSuspended(ActScaleChoice, { props: { scales: ['a', 'b', 'c', 'd', 'e'].map(id => scale(id)), modelValue: 'd' } })
    expect(allByRole(choice.element, 'button')).toHaveLength(0)
    expect((byRole(choice.element, 'combobox', 'On which scale') as HTMLSelectElement).value).toBe('d')
  })

  it('is not asked for where no scale is in use', async () => {
    const choice = await mountSuspended(ActScaleChoice, { props: { scales: [scale('a', false)], modelValue: '' } })
    expect(choice.text()).toBe('')
  })
})
