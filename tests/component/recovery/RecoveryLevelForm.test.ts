import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import RecoveryLevelForm from '~~/components/recovery/RecoveryLevelForm.vue'
import { levelDraft } from '~~/utils/recovery/levelDraft'

async function refrigerantFor(asked: string): Promise<{ chosen: string, offered: string[] }> {
  const wrapper = await mountSuspended(RecoveryLevelForm, { props: { modelValue: levelDraft({ refrigerant: asked }), unit: 'lb', refrigerants: ['R-22', 'R-134a'] } })
  const select = wrapper.find('select').element as HTMLSelectElement
  return { chosen: select.value, offered: [...select.options].map(option => option.value).filter(value => value !== '') }
}

it('has the refrigerant of the address chosen, in whatever case it was written there', async () => {
  expect(await refrigerantFor('r-134A')).toEqual({ chosen: 'R-134a', offered: ['R-22', 'R-134a'] })
})

it('keeps a name that the catalogue does not have in sight', async () => {
  expect(await refrigerantFor('R-9999')).toEqual({ chosen: 'R-9999', offered: ['R-22', 'R-134a', 'R-9999'] })
})
