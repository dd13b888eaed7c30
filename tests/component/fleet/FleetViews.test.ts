import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, describe, expect, it } from 'vitest'
import { nextTick } from 'vue'
import FleetViews from '~~/components/fleet/FleetViews.vue'
import type { FleetView } from '~~/utils/contract/fleetViews'
import { allByRole, byRole } from '../../helpers/roles'

const VIEWS: FleetView[] = [
  { id: 'v1', name: 'Due soon, north', query: { dueBefore: '2027-03', place: 'north' } },
  { id: 'v2', name: 'R-22', query: { refrigerant: 'R-22' } },
]

async function open(address: Record<string, string>, more: Record<string, unknown> = {}) {
  const views = await mountSuspended(FleetViews, {
    props: { 'views': VIEWS, address, 'onUpdate:naming': (naming: 'new' | 'rename' | null | undefined) => views.setProps({ naming }), ...more }, attachTo: document.body,
  })
  return {
    views,
    buttons: () => allByRole(views.element, 'button').map(button => button.textContent?.trim()),
    async press(name: string | RegExp) {
      byRole(document.body, 'button', name).click()
      await nextTick()
    },
    field: () => byRole(document.body, 'textbox', 'Name of the view') as HTMLInputElement,
    async type(text: string) {
      const field = byRole(document.body, 'textbox', 'Name of the view') as HTMLInputElement
      field.value = text
      field.dispatchEvent(new Event('input'))
      await nextTick()
    },
  }
}

afterEach(() => {
  document.body.innerHTML = ''
})

describe('the named views of the fleet', () => {
  it('lead to their filters, and mark the one that stands, in whatever order its parts are written', async () => {
    const { views } = await open({ place: 'north', dueBefore: '2027-03' })
    const links = allByRole(views.element, 'link')
    expect(links.map(link => [link.textContent?.trim(), link.getAttribute('aria-current')])).toEqual([['Due soon, north', 'page'], ['R-22', null]])
    expect(links[1]!.getAttribute('href')).toBe('/fleet?refrigerant=R-22')
  })

  it('offer to rename and remove the one that stands, and no other', async () => {
    const { views, buttons, press } = await open({ refrigerant: 'R-22' })
    expect(buttons()).toEqual(expect.arrayContaining(['Rename', 'Remove']))
    expect(buttons()).not.toContain('Save this view')
    await press(/^Remove/)
    expect(views.emitted('remove')).toEqual([[VIEWS[1]]])
  })

  it('offer to keep what is not kept yet, and nothing of the fleet as it is', async () => {
    expect((await open({ refrigerant: 'R-32' })).buttons()).toContain('Save this view')
    document.body.innerHTML = ''
    const plain = await open({})
    for (const word of ['Save this view', 'Rename', 'Remove']) expect(plain.buttons()).not.toContain(word)
  })

  it('are kept under a name that was typed, and never without one', async () => {
    const { views, press, type } = await open({ refrigerant: 'R-32' })
    await press('Save this view')
    await type('   ')
    await press('Keep the name')
    expect(views.emitted('save')).toBeUndefined()
    await type(' Mild gases ')
    await press('Keep the name')
    expect(views.emitted('save')).toEqual([['Mild gases']])
  })

  it('are renamed beginning from the name they have', async () => {
    const { views, press, field, type } = await open({ refrigerant: 'R-22' })
    await press(/^Rename/)
    expect(field().value).toBe('R-22')
    await type('R-22, last of it')
    await press('Keep the name')
    expect(views.emitted('rename')).toEqual([['v2', 'R-22, last of it']])
  })

  it('say beside the name what speaks against it', async () => {
    const { press } = await open({ refrigerant: 'R-32' }, { problem: 'You have a view of that name.' })
    await press('Save this view')
    expect(document.body.textContent).toContain('You have a view of that name.')
  })
})
