import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import { nextTick } from 'vue'
import RuleForm from '~~/components/rule/RuleForm.vue'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import { DEFAULT_RETEST_SETTINGS } from '~~/utils/requalification/retestSettings'
import { allByRole, byRole } from '../../helpers/roles'

async function open(kind: 'fill-policy' | 'retest', isPreviewed = false) {
  const form = await mountSuspended(RuleForm, {
    props: { kind, fillPolicy: DEFAULT_FILL_POLICY, retest: DEFAULT_RETEST_SETTINGS, tomorrow: '2026-12-02', isPreviewed },
  })
  const field = (name: string) => byRole(form.element, 'textbox', name) as HTMLInputElement
  async function type(name: string, text: string) {
    field(name).value = text
    field(name).dispatchEvent(new Event('input'))
    await nextTick()
  }
  async function press(name: string) {
    const button = byRole(form.element, 'button', name)
    if (button.getAttribute('type') === 'submit') await form.find('form').trigger('submit')
    else button.click()
    await nextTick()
  }
  return { form, field, type, press }
}

describe('the form of a firm rule', () => {
  it('begins from the rule in force', async () => {
    const { field } = await open('fill-policy')
    expect(field('Share of the cylinder').value).toBe('80')
    expect(field('Liquid at 131 °F, at most').value).toBe('95')
  })

  it('shows what would change before it can be set', async () => {
    const { form, type, press } = await open('fill-policy')
    await type('Share of the cylinder', '77.5')
    expect(allByRole(form.element, 'button', 'Set this rule')).toHaveLength(0)
    await press('Show what it changes')
    expect(form.emitted('preview')).toEqual([[{ kind: 'fill-policy', value: { share: 0.775, ceiling: 0.95, options: { liquid130F: false, unRatio: false } } }]])
    expect(form.emitted('save')).toBeUndefined()
  })

  it('refuses what is looser than may be, beside the field', async () => {
    const { form, type, press } = await open('fill-policy')
    await type('Share of the cylinder', '80.1')
    expect(form.text()).not.toContain('At most 80 %')
    await press('Show what it changes')
    expect(form.text()).toContain('At most 80 %')
    expect(form.emitted('preview')).toBeUndefined()
  })

  it('is set only with a reason', async () => {
    const { form, type, press } = await open('fill-policy', true)
    await press('Set this rule')
    expect(form.emitted('save')).toBeUndefined()
    expect(form.text()).toContain('Say why')
    await type('Why', 'The vans stand in the sun')
    await press('Set this rule')
    expect(form.emitted('save')).toEqual([[{ kind: 'fill-policy', value: { share: 0.8, ceiling: 0.95, options: { liquid130F: false, unRatio: false } } }, 'The vans stand in the sun']])
  })

  it('says when what was previewed is no longer what is typed', async () => {
    const { form, type } = await open('fill-policy', true)
    await type('Why', 'A reason changes no figure')
    expect(form.emitted('change')).toBeUndefined()
    await type('Liquid at 131 °F, at most', '90')
    expect(form.emitted('change')).toHaveLength(1)
  })

  it('begins on a day to come, never on one that has passed', async () => {
    const { form, press } = await open('fill-policy')
    await press('on a day')
    const day = form.find<HTMLInputElement>('input[type=date]')
    await day.setValue('2026-12-01')
    await press('Show what it changes')
    expect(form.text()).toContain('A day to come')
    expect(form.emitted('preview')).toBeUndefined()
    await day.setValue('2026-12-02')
    await press('Show what it changes')
    expect(form.emitted('preview')![0]).toMatchObject([{ from: '2026-12-02' }])
  })

  it('shows what a paragraph asks once it is chosen, and asks how that is known', async () => {
    const { form, press } = await open('retest')
    expect(form.text()).not.toContain('Coated outside against corrosion')
    const choices = form.findAll('input[type=checkbox]')
    await choices.find(box => box.element.closest('label')?.textContent?.includes('180.209(e)'))!.setValue(true)
    expect(form.text()).toContain('Coated outside against corrosion')
    await press('Show what it changes')
    expect(form.text()).toContain('Say how it is known')
    expect(form.emitted('preview')).toBeUndefined()
  })
})
