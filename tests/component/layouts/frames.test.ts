import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { readBody } from 'h3'
import { describe, expect, it, vi } from 'vitest'
import DeskFrame from '~~/layouts/desk.vue'
import FieldFrame from '~~/layouts/field.vue'
import PlainFrame from '~~/layouts/plain.vue'
import { usePreferencesStore } from '~~/stores/preferences'
import { useSessionStore } from '~~/stores/session'
import type { Units, User } from '~~/utils/contract/session'
import { allByRole, byRole } from '../../helpers/roles'

const items = [{ label: 'Fleet', to: '/fleet' }, { label: 'Places', to: '/places' }]
const person = { name: 'M. Sorrel', role: 'manager' }

describe.each([['field', FieldFrame, {}], ['desk', DeskFrame, { items, person }], ['plain', PlainFrame, {}]])('the %s frame', (_name, Frame, props) => {
  it('has a band, one main part, and a way to skip to it', async () => {
    const wrapper = await mountSuspended(Frame as typeof PlainFrame, { props, slots: { default: () => 'the page' } })
    expect(allByRole(wrapper.element, 'banner')).toHaveLength(1)
    const main = byRole(wrapper.element, 'main')
    expect(main.textContent).toContain('the page')
    expect(byRole(wrapper.element, 'link', 'Skip to the page').getAttribute('href')).toBe(`#${main.id}`)
  })
})

describe('the unit of weights', () => {
  const MEMBER: User = { id: 'p', name: 'M. Sorrel', email: 'm@firm.example', roles: ['technician'], trainee: false, certification: null, certificationType: null, certificationNumber: null, units: 'lb' }
  const kept: string[] = []
  registerEndpoint('/api/session/units', { method: 'PATCH', handler: async (event) => {
    const { units } = await readBody<{ units: Units }>(event)
    kept.push(units)
    return { user: { ...MEMBER, units } }
  } })

  it.each([['field', FieldFrame, {}], ['desk', DeskFrame, { items, person }]])('is chosen in the band of every screen of the %s, and kept with the person', async (_name, Frame, props) => {
    useSessionStore().set(MEMBER)
    const wrapper = await mountSuspended(Frame as unknown as typeof PlainFrame, { props })
    const choice = byRole(wrapper.element, 'combobox', 'Weights in') as HTMLSelectElement
    expect(choice.value).toBe('lb')
    choice.value = 'kg'
    choice.dispatchEvent(new Event('change'))
    expect(usePreferencesStore().unit).toBe('kg')
    await vi.waitFor(() => expect(kept.at(-1)).toBe('kg'))
    kept.length = 0
    useSessionStore().set(null)
  })

  it('goes by who is signed in, not by who used this device before', () => {
    useSessionStore().set({ ...MEMBER, units: 'kg' })
    expect(usePreferencesStore().unit).toBe('kg')
    useSessionStore().set({ ...MEMBER, id: 'q', units: 'lb-oz' })
    expect(usePreferencesStore().unit).toBe('lb-oz')
    useSessionStore().set(null)
  })

  it('is asked of nobody who is not signed in', async () => {
    const wrapper = await mountSuspended(FieldFrame)
    expect(allByRole(wrapper.element, 'combobox')).toHaveLength(0)
  })
})

describe('the field frame', () => {
  it('holds the plate in its band and the main act at its foot', async () => {
    const wrapper = await mountSuspended(FieldFrame, {
      props: { title: 'My van', back: '/scan' },
      slots: { band: () => 'the plate', foot: () => 'the act', status: () => 'online' },
    })
    expect(byRole(wrapper.element, 'banner').textContent).toContain('the plate')
    expect(byRole(wrapper.element, 'heading', 'My van').tagName).toBe('H1')
    expect(byRole(wrapper.element, 'link', 'Back').getAttribute('href')).toBe('/scan')
    expect(wrapper.find('[data-foot]').text()).toBe('the act')
  })
})

describe('the desk frame', () => {
  it('marks the page that is open and no other', async () => {
    const wrapper = await mountSuspended(DeskFrame, { props: { items: [{ label: 'Start', to: '/' }, ...items], person } })
    expect(allByRole(wrapper.element, 'link').filter(link => link.getAttribute('aria-current') === 'page').map(link => link.textContent)).toEqual(['Start'])
  })

  it('shows the screens that a word of its navigation stands for, where one of them is open', async () => {
    const settings = { label: 'Settings', to: '/rules', within: [{ label: 'Start', to: '/' }, { label: 'Scales', to: '/scales' }] }
    const wrapper = await mountSuspended(DeskFrame, { props: { items: [...items, settings], person } })
    const [main, within] = allByRole(wrapper.element, 'navigation')
    expect(allByRole(main!, 'link').map(link => [link.textContent?.trim(), link.getAttribute('aria-current')])).toEqual([['Fleet', null], ['Places', null], ['Settings', 'true']])
    expect(within!.getAttribute('aria-label')).toBe('Settings')
    expect(allByRole(within!, 'link').map(link => [link.textContent?.trim(), link.getAttribute('aria-current')])).toEqual([['Start', 'page'], ['Scales', null]])
  })

  it('opens its menu on a narrow screen by a button that says whether it is open', async () => {
    const wrapper = await mountSuspended(DeskFrame, { props: { items, person } })
    const menu = byRole(wrapper.element, 'button', 'Menu')
    expect(menu.getAttribute('aria-expanded')).toBe('false')
    menu.click()
    await wrapper.vm.$nextTick()
    expect(menu.getAttribute('aria-expanded')).toBe('true')
    await wrapper.find('header').trigger('keydown', { key: 'Escape' })
    expect(menu.getAttribute('aria-expanded')).toBe('false')
  })

  it('takes a typed code and a sign-out', async () => {
    const wrapper = await mountSuspended(DeskFrame, { props: { items, person } })
    const field = byRole(wrapper.element, 'textbox', 'Scan, or type a code') as HTMLInputElement
    await wrapper.find('form').trigger('submit')
    expect(wrapper.emitted('code')).toBeUndefined()
    field.value = ' 7k3 m9q 2tx '
    field.dispatchEvent(new Event('input'))
    await wrapper.find('form').trigger('submit')
    expect(wrapper.emitted('code')).toEqual([['7k3 m9q 2tx']])
    expect(field.value).toBe('')
    byRole(wrapper.element, 'button', 'Sign out').click()
    expect(wrapper.emitted('sign-out')).toHaveLength(1)
  })

  it('offers neither code nor sign-out to nobody', async () => {
    const wrapper = await mountSuspended(DeskFrame, { props: { items: [], person: null } })
    expect(allByRole(wrapper.element, 'button')).toHaveLength(0)
  })
})
