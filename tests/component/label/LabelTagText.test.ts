import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LabelTagText from '~~/components/label/LabelTagText.vue'
import type { ContentsTag } from '~~/utils/document/contentsTag'
import { allByRole, byRole } from '../../helpers/roles'

const TAG: ContentsTag = {
  code: '7K3M9Q2TX', refrigerant: 'R-22', kind: 'Recovered', net: '14.3 lb (6.49 kg)', on: '2026-11-02T12:00:00.000Z', technician: 'Tina', numberHeightMm: 12,
  entry: { un: 'UN1018', properShippingName: 'Chlorodifluoromethane or Refrigerant gas R 22', judgement: null, source: '49 CFR 172.101' },
}

async function mount(judgement: string | null) {
  return await mountSuspended(LabelTagText, { props: { tag: { ...TAG, entry: { ...TAG.entry, judgement } }, lines: ['R-22', 'Recovered', 'UN1018'] } })
}

describe('a contents tag to write by hand', () => {
  it('has its lines in their order, and how high the number is to be', async () => {
    const { element } = await mount(null)
    expect(allByRole(element, 'listitem').map(line => line.textContent?.trim())).toEqual(['R-22', 'Recovered', 'UN1018'])
    expect(element.textContent).toContain('at least 12 mm high')
  })

  it('says what is the shipper\'s to judge, and nothing of it where nothing is open', async () => {
    const open = (await mount('The shipper classifies it.')).element
    byRole(open, 'heading', 'For the shipper to judge')
    expect(open.textContent).toContain('The shipper classifies it.')
    expect(allByRole((await mount(null)).element, 'heading', 'For the shipper to judge')).toHaveLength(0)
  })
})
