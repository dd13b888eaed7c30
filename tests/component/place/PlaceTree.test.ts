import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import PlaceTree from '~~/components/place/PlaceTree.vue'
import type { Place } from '~~/utils/contract/places'
import { placeBranches } from '~~/utils/places/placeBranches'
import { allByRole, byRole } from '../../helpers/roles'

const place = (id: string, kind: Place['kind'], change: Partial<Place> = {}): Place =>
  ({ id, name: id, kind, parentId: null, firmId: null, technicianId: null, technicianName: null, active: true, cylinders: 0, ...change })

async function tree(mayManage = true) {
  const places = [
    place('North shop', 'shop'), place('Bay 1', 'rack', { parentId: 'North shop' }), place('Bay 2', 'rack', { parentId: 'North shop' }),
    place('Van 12', 'van', { technicianName: 'Ida Holt' }),
  ]
  const standing = [{ placeId: 'Bay 1', cylinders: 2, grossGrams: 60_000, withoutWeight: 1, refrigerants: [{ refrigerant: 'R-22', cylinders: 2 }] }]
  const wrapper = await mountSuspended(PlaceTree, { props: { branches: placeBranches(places, standing), unit: 'lb', mayManage }, attachTo: document.body })
  return { wrapper, root: wrapper.element as HTMLElement }
}

describe('the places on the screen', () => {
  it('stand inside each other, with what stands in the whole branch', async () => {
    const { root } = await tree()
    const inShop = root.querySelector(`[aria-label="In North shop"]`)!
    expect(byRole(inShop, 'link', 'Bay 1').getAttribute('href')).toContain('/fleet?place=Bay')
    expect(root.textContent).toContain('2 cylinders, 132.3\u00A0lb gross and 1 not weighed')
    expect(allByRole(inShop, 'link').map(link => link.textContent!.trim())).not.toContain('Van 12')
  })

  it('show a van with its technician and lead to what is aboard', async () => {
    const { root } = await tree()
    expect(root.textContent).toContain('van, Ida Holt')
    expect(byRole(root, 'link', 'Van 12').getAttribute('href')).toBe('/vans/Van 12')
  })

  it('are closed only where nothing stands in them', async () => {
    const { root, wrapper } = await tree()
    expect(allByRole(root, 'button', /^Close/).map(button => button.getAttribute('aria-label'))).toEqual(['Close Bay 2', 'Close Van 12'])
    byRole(root, 'button', 'Close Bay 2').click()
    expect(wrapper.emitted('turn')![0]).toMatchObject([{ id: 'Bay 2' }, false])
  })

  it('fold away what is inside, and say so', async () => {
    const { root, wrapper } = await tree()
    const fold = byRole(root, 'button', 'Places in North shop')
    expect(fold.getAttribute('aria-expanded')).toBe('true')
    fold.click()
    await wrapper.vm.$nextTick()
    expect(fold.getAttribute('aria-expanded')).toBe('false')
    expect(root.querySelector<HTMLElement>(`[id="${fold.getAttribute('aria-controls')}"]`)!.style.display).toBe('none')
  })

  it('are changed only by those who may', async () => {
    const { root } = await tree(false)
    expect(allByRole(root, 'button').map(button => button.getAttribute('aria-label'))).toEqual(['Places in North shop'])
  })
})
