import { flushPromises } from '@vue/test-utils'
import { mountSuspended } from '@nuxt/test-utils/runtime'
import { h, reactive } from 'vue'
import { describe, expect, it } from 'vitest'
import CheckedForm from '~~/components/act/CheckedForm.vue'
import { CHECKED, type CheckedDraft } from '~~/utils/custody/draft/checked'
import type { DraftContext } from '~~/utils/custody/draft/draft'
import { filled, registered, viewAfter, type Told } from '../../helpers/custody'
import { allByRole, byRole } from '../../helpers/roles'

const LISTS = { places: [], firms: [], people: [], scales: [], refrigerants: ['R-22', 'R-410A', 'R-134a'], recent: ['R-410A'] }

async function openForm(story: Told[]) {
  const context = { view: viewAfter(story), unit: 'lb' } as DraftContext
  const draft = reactive(CHECKED.empty(context)) as CheckedDraft
  const form = await mountSuspended({ render: () => h('form', [h(CheckedForm, { context, lists: LISTS, modelValue: draft, unit: 'lb' })]) })
  const root = form.element as HTMLElement
  return {
    root, draft, context,
    async type(name: string, text: string) {
      const field = byRole(root, 'textbox', name) as HTMLInputElement
      field.value = text
      field.dispatchEvent(new Event('input'))
      await settled()
    },
    async press(name: string) {
      byRole(root, 'button', name).click()
      await settled()
    },
  }
}

/** The verdict is a part of its own that is fetched when it is first needed. */
async function settled() {
  await flushPromises()
  await new Promise(resolve => setTimeout(resolve, 50))
  await flushPromises()
}

describe('the form of a check by pressure', () => {
  it('says at once whether the pressure agrees with what the log has, in words and in a picture', { timeout: 20_000 }, async () => {
    const { root, type } = await openForm([registered(), filled('R-22', 20)])
    await type('Gauge', '143.6')
    expect(root.textContent).not.toContain('Agrees with')
    await type('Thermometer', '80')
    await expect.poll(() => root.textContent, { timeout: 15_000 }).toContain('Agrees with R-22')
    expect(byRole(root, 'img', /The gauge shows 143\.6\u00A0psig\. At 80\.0\u00A0°F R-22/)).toBeTruthy()
    await type('Gauge', '163.6')
    expect(root.textContent).toMatch(/(19\.9|20\.0|20\.1)\u00A0psi above R-22/)
    expect(root.textContent).toContain('a pressure cannot tell which')
    await type('Gauge', '100')
    expect(root.textContent).toContain('below R-22')
  })

  it('compares with none where the log names none, and takes the reading all the same', async () => {
    const { root, type, draft, context } = await openForm([registered(), filled(null, 20)])
    await type('Gauge', '143.6')
    await type('Thermometer', '80')
    expect(root.textContent).toContain('The log names no refrigerant in it')
    expect(root.textContent).not.toContain('Agrees with')
    expect(CHECKED.read(draft, context)).toMatchObject({ details: { method: 'pressure' } })
  })

  it('has the procedure beside it', async () => {
    const { root } = await openForm([registered(), filled('R-22', 20)])
    expect(root.textContent).toContain('never to the air')
  })
})

describe('the form of an analysis', () => {
  it('takes its parts line by line and asks for its verdict, what the cylinder holds first', async () => {
    const { root, type, press, draft, context } = await openForm([registered(), filled('R-22', 20)])
    await press('Laboratory')
    const [named] = allByRole(root, 'combobox') as HTMLSelectElement[]
    expect([...named!.options].map(option => option.textContent!.trim())).toEqual([
      'Choose what it was found to be', 'R-22', 'R-410A', 'R-134a', 'None that can be named',
    ])
    await type('Part 1', 'R-22')
    await type('Percent of part 1', '97.5')
    await press('Another part')
    await type('Part 2', 'air')
    await type('Percent of part 2', '2.5')
    for (const [index, value] of ['R-22', 'suspect'].entries()) {
      const select = allByRole(root, 'combobox')[index] as HTMLSelectElement
      select.value = value
      select.dispatchEvent(new Event('change'))
    }
    await settled()
    expect(CHECKED.read(draft, context)).toEqual({
      details: {
        method: 'laboratory', composition: [{ component: 'R-22', massPercent: 97.5 }, { component: 'air', massPercent: 2.5 }],
        verdict: { refrigerant: 'R-22', condition: 'suspect' },
      },
    })
    await press('Take out part 2')
    expect(draft.analysis.parts).toEqual([{ component: 'R-22', percent: '97.5' }])
  })
})
