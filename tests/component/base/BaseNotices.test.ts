import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import BaseBusy from '~~/components/base/BaseBusy.vue'
import BaseEmpty from '~~/components/base/BaseEmpty.vue'
import BaseProblem from '~~/components/base/BaseProblem.vue'
import BaseToast from '~~/components/base/BaseToast.vue'
import { byRole } from '../../helpers/roles'

describe('what a screen says when there is nothing to show', () => {
  it('says why it is empty and what to do next', async () => {
    const wrapper = await mountSuspended(BaseEmpty, { props: { why: 'No label is printed yet.', next: 'Print ten labels.' } })
    expect(wrapper.text()).toBe('No label is printed yet.Print ten labels.')
  })

  it('says what it waits for and how far it is', async () => {
    const wrapper = await mountSuspended(BaseBusy, { props: { text: 'Drawing labels', done: 0, total: 60 } })
    expect(byRole(wrapper.element, 'status').textContent).toContain('0 of 60')
  })

  it('words a refusal with each thing that is wrong, and tries again', async () => {
    const wrapper = await mountSuspended(BaseProblem, {
      props: { retry: true, problem: { title: 'Not recorded', detail: 'Two figures are wrong.', errors: [{ path: 'gross', message: 'is below the tare' }, { path: '', message: 'needs a place' }] } },
    })
    const alert = byRole(wrapper.element, 'alert')
    expect(alert.textContent).toContain('Two figures are wrong.')
    expect(wrapper.findAll('li').map(item => item.text())).toEqual(['gross: is below the tare', 'needs a place'])
    byRole(wrapper.element, 'button', 'Try again').click()
    expect(wrapper.emitted('retry')).toHaveLength(1)
  })

  it('never shows a refusal without words', async () => {
    const wrapper = await mountSuspended(BaseProblem, { props: { problem: {} } })
    expect(byRole(wrapper.element, 'alert').textContent).toContain('That did not work')
  })
})

describe('the notice of what was done', () => {
  it('keeps its region while it is empty, so that the next text is read out', async () => {
    const wrapper = await mountSuspended(BaseToast, { props: { text: '' } })
    expect(byRole(wrapper.element, 'status').textContent).toBe('')
    await wrapper.setProps({ text: 'Moved to Van 12.', undo: true })
    expect(byRole(wrapper.element, 'status').textContent).toContain('Moved to Van 12.')
  })

  it('takes it back, or goes away', async () => {
    const wrapper = await mountSuspended(BaseToast, { props: { text: 'Moved.', undo: true } })
    byRole(wrapper.element, 'button', 'Undo').click()
    byRole(wrapper.element, 'button', 'Put this notice away').click()
    expect(wrapper.emitted('undo')).toHaveLength(1)
    expect(wrapper.emitted('close')).toHaveLength(1)
  })
})
