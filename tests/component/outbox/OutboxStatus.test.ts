import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import OutboxDrop from '~~/components/outbox/OutboxDrop.vue'
import OutboxEntryCard from '~~/components/outbox/OutboxEntryCard.vue'
import OutboxStatus from '~~/components/outbox/OutboxStatus.vue'
import type { CustodyEvent } from '~~/utils/custody/event'
import { newEntry, type OutboxEntry } from '~~/utils/outbox/entry'
import { allByRole, byRole } from '../../helpers/roles'

const HOUR = 3_600_000
const status = (props: Partial<{ waiting: number, refused: number, oldestMs: number | null, pause: 'offline' | 'sign-in' | null }>) =>
  mountSuspended(OutboxStatus, { props: { waiting: 0, refused: 0, oldestMs: null, pause: null, ...props } })

describe('what is not recorded yet, in the band', () => {
  it('is nothing to see where there is nothing, and is heard as soon as there is', async () => {
    const wrapper = await status({})
    expect(allByRole(wrapper.element, 'link')).toHaveLength(0)
    expect(byRole(wrapper.element, 'status').textContent).toBe('')
    await wrapper.setProps({ waiting: 3, oldestMs: 2 * HOUR })
    expect(byRole(wrapper.element, 'status').textContent).toBe('3 waiting to send')
    expect(byRole(wrapper.element, 'link', '3 waiting to send, oldest 2 h').getAttribute('href')).toBe('/unsent')
  })

  it.each([
    ['a refused one', { waiting: 1, refused: 1, oldestMs: HOUR }, '1 refused, 1 waiting to send'],
    ['one that waits for a day', { waiting: 1, oldestMs: 24 * HOUR }, '1 waiting to send'],
    ['a session that has ended', { waiting: 2, oldestMs: HOUR, pause: 'sign-in' as const }, 'sign in again'],
  ])('asks to be looked at by a shape and a word: %s', async (_what, props, words) => {
    const wrapper = await status(props)
    expect(wrapper.find('svg').exists()).toBe(true)
    expect(wrapper.text()).toContain(words)
  })

  it('asks for nothing while it waits for less than a day', async () => {
    expect((await status({ waiting: 1, oldestMs: 24 * HOUR - 1 })).find('svg').exists()).toBe(false)
  })
})

describe('an entry that is not recorded', () => {
  const NOON = Date.parse('2026-12-01T18:00:00Z')
  const event = { id: 'e', cylinderId: 'c', kind: 'weighed', occurredAt: '2026-12-01T11:30:00-06:00', deviceId: 'd', deviceSeq: 1, details: { gross: { value: 40, unit: 'lb' } } } as unknown as CustodyEvent
  const card = (more: Partial<OutboxEntry>) => mountSuspended(OutboxEntryCard, {
    props: { entry: { ...newEntry(event, 'tina', NOON), ...more }, cylinder: { name: '7K3 M9Q 2TX', to: '/c/c' }, timeZone: 'America/Chicago', nowMs: NOON, mendTo: '/c/c/act/weighed?mend=e' },
  })
  const acts = (wrapper: Awaited<ReturnType<typeof card>>) => [...allByRole(wrapper.element, 'button'), ...allByRole(wrapper.element, 'link')].map(each => each.textContent?.trim())

  it('says what it is, when it happened and what the scale showed, and can be taken back while it was never sent', async () => {
    const wrapper = await card({})
    expect(wrapper.text()).toContain('Weighed, 7K3 M9Q 2TX')
    expect(wrapper.text()).toContain('Waiting to send')
    expect(wrapper.text()).toContain('Happened today 11:30, saved today 12:00')
    expect(acts(wrapper)).toEqual(['Take it back: Weighed, 7K3 M9Q 2TX', 'The cylinder: 7K3 M9Q 2TX'])
  })

  it('is not taken back where it may have arrived', async () => {
    const problem = { type: 'about:blank', title: 'No', status: 500, detail: 'The server could not answer.' }
    const wrapper = await card({ firstSentAt: NOON, tries: 2, problem })
    expect(wrapper.text()).toContain('At the last of 2 tries: The server could not answer.')
    expect(acts(wrapper)).toEqual(['The cylinder: 7K3 M9Q 2TX'])
  })

  it('that was refused says why, and is mended or dropped', async () => {
    const wrapper = await card({ state: 'refused', problem: { type: 'about:blank', title: 'No', status: 422, detail: 'Choose again.' } })
    expect(wrapper.text()).toContain('Refused')
    expect(wrapper.text()).toContain('Choose again.')
    expect(acts(wrapper)).toEqual(['Drop it: Weighed, 7K3 M9Q 2TX', 'Mend it: Weighed, 7K3 M9Q 2TX', 'The cylinder: 7K3 M9Q 2TX'])
  })
})

describe('dropping an entry', () => {
  it('needs a reason', async () => {
    const wrapper = await mountSuspended(OutboxDrop, { props: { modelValue: true, what: 'Weighed, 7K3 M9Q 2TX' } })
    const press = () => wrapper.findAll('button').find(button => button.text() === 'Drop it')!.trigger('click')
    await press()
    expect(wrapper.emitted('drop')).toBeUndefined()
    expect(wrapper.text()).toContain('Say why it is dropped.')
    await wrapper.get('input').setValue(' weighed twice ')
    await press()
    expect(wrapper.emitted('drop')).toEqual([['weighed twice']])
  })
})
