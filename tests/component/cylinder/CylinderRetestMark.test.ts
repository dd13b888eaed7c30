import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import CylinderRetestMark from '~~/components/cylinder/CylinderRetestMark.vue'
import type { KeptMark } from '~~/utils/requalification/struckMark'
import { byRole } from '../../helpers/roles'

async function drawn(mark: KeptMark) {
  const wrapper = await mountSuspended(CylinderRetestMark, { props: { mark } })
  return { wrapper, picture: wrapper.element as HTMLElement }
}

describe('a retest mark', () => {
  it('is drawn as struck, the square read clockwise', async () => {
    const { picture } = await drawn({ month: '2006-09', rin: 'A123', suffix: 'S' })
    expect([...picture.querySelectorAll('span')].filter(part => part.children.length === 0).map(part => part.textContent)).toEqual(['9', 'A1', '32', '06', 'S'])
  })

  it('says in words what is drawn', async () => {
    const { wrapper } = await drawn({ month: '2006-09', rin: 'A123' })
    const named = byRole(wrapper.element.parentElement!, 'img', 'Tested September 2006 by RIN A123, no suffix: volumetric expansion test')
    expect(named).toBe(wrapper.element)
  })

  it('draws a star as a star, and leaves the square empty where the RIN is not known', async () => {
    const { picture } = await drawn({ month: '2006-09', suffix: '*' })
    expect(picture.querySelectorAll('svg')).toHaveLength(1)
    expect(picture.textContent).toBe('906')
  })
})
