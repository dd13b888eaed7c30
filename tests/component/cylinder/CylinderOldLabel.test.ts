import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import CylinderOldLabel from '~~/components/cylinder/CylinderOldLabel.vue'

async function said(props: { rightCode: string | null, since: string | null }) {
  return (await mountSuspended(CylinderOldLabel, { props: { oldCode: '10100000E', ...props } })).text()
}

describe('a replaced label that was scanned', () => {
  it('asks to be taken off and names the right one, with its day', async () => {
    const text = await said({ rightCode: '7K3 M9Q 2TX', since: '1 Dec 09:41' })
    expect(text).toContain('The label 101 000 00E was replaced. Please take it off; the right one is 7K3 M9Q 2TX, on it since 1 Dec 09:41.')
  })

  it('says where there is no other', async () => {
    expect(await said({ rightCode: null, since: null })).toContain('the cylinder has no other yet.')
  })
})
