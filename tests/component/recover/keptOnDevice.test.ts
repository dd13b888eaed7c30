import { mountSuspended } from '@nuxt/test-utils/runtime'
import { expect, it } from 'vitest'
import { defineComponent, h, nextTick } from 'vue'
import { useKeptForm } from '~~/composables/useKeptForm'
import { keptPrefix } from '~~/composables/keptPrefix'

const KEY = keptPrefix(undefined) + 'a form'

/** Another tab has changed what is kept. */
async function heard() {
  window.dispatchEvent(new StorageEvent('storage', { key: KEY }))
  await nextTick()
  await nextTick()
}

it('a form on the device follows another tab, and is not kept again once that one has ended it', async () => {
  let form!: ReturnType<typeof useKeptForm<{ typed: string }>>
  const page = await mountSuspended(defineComponent({
    setup() {
      form = useKeptForm('a form', () => ({ typed: '' }), () => '', 'device')
      return () => h('p')
    },
  }))
  form.draft.value.typed = 'here'
  await nextTick()
  expect(JSON.parse(localStorage.getItem(KEY)!).draft).toEqual({ typed: 'here' })

  const entry = { draft: { typed: 'there' }, envelope: { at: '', supervisorId: '', note: '' }, sent: null }
  localStorage.setItem(KEY, JSON.stringify(entry))
  const events = heard()
  // The other tab ends it before this one has drawn what it kept.
  localStorage.removeItem(KEY)
  await events
  expect(form.draft.value.typed).toBe('there')
  expect(localStorage.getItem(KEY)).toBeNull()

  await heard()
  expect(form.endedElsewhere.value).toBe(true)
  page.unmount()
})
