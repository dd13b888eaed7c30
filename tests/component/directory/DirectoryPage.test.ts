import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, describe, expect, it } from 'vitest'
import { defineComponent, h, nextTick, shallowRef } from 'vue'
import DirectoryPage from '~~/components/directory/DirectoryPage.vue'
import { byRole } from '../../helpers/roles'

let wrapper: Awaited<ReturnType<typeof mountSuspended>> | null = null
afterEach(() => wrapper?.unmount())

const editing = shallowRef<object | null>(null)
const Page = defineComponent(() => () => h(DirectoryPage, {
  title: 'Scales', sub: 'how far a weight may be off', add: 'Add a scale', mayAdd: true, problem: null, editing: editing.value, formTitle: 'Add a scale now',
  onAdd: () => {
    editing.value = {}
  },
}, {
  form: () => h('label', ['Name', h('input')]),
  default: () => h('button', { onClick: () => {
    editing.value = {}
  } }, 'Change Dock'),
}))

async function page() {
  editing.value = null
  wrapper = await mountSuspended(Page, { attachTo: document.body })
  return wrapper
}

async function pressed(name: string) {
  const button = byRole(wrapper!.element.parentElement!, 'button', name)
  button.focus()
  button.click()
  await nextTick()
  await nextTick()
  return button
}

describe('the form above a small list', () => {
  it('opens with the first field ready to be typed into, and gives the place back to what has opened it', async () => {
    await page()
    const change = await pressed('Change Dock')
    expect(document.activeElement!.tagName).toBe('INPUT')
    expect(byRole(document.body, 'heading', 'Add a scale now')).toBeTruthy()
    editing.value = null
    await nextTick()
    await nextTick()
    expect(document.activeElement).toBe(change)
  })

  it('goes on to another without forgetting what has opened it first', async () => {
    await page()
    const add = await pressed('Add a scale')
    await pressed('Change Dock')
    expect(document.activeElement!.tagName).toBe('INPUT')
    editing.value = null
    await nextTick()
    await nextTick()
    expect(document.activeElement).toBe(add)
  })
})
