import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { flushPromises } from '@vue/test-utils'
import { afterEach, describe, expect, it, vi } from 'vitest'
import AccountPage from '~~/pages/account.vue'
import { usePostingStore } from '~~/stores/posting'
import { useSessionStore } from '~~/stores/session'
import type { User } from '~~/utils/contract/session'
import { burst, press } from '../../helpers/keyBurst'

const TINA: User = { id: 'p', name: 'Tina', email: 't@firm.example', roles: ['technician'], trainee: false, certification: null, certificationType: null, certificationNumber: null, units: 'lb' }
registerEndpoint('/api/session', () => ({ user: TINA }))

let wrapper: Awaited<ReturnType<typeof mountSuspended>> | null = null
afterEach(() => {
  vi.useRealTimers()
  wrapper?.unmount()
  useSessionStore().set(null)
})

describe('a label scanned on a page that does nothing with labels of its own', () => {
  async function account() {
    useSessionStore().set(TINA)
    const page = wrapper = await mountSuspended(AccountPage, { route: '/account', attachTo: document.body })
    vi.useFakeTimers()
    return page.get('input[type="password"]').element as HTMLInputElement
  }

  it('is lifted out of the field that is filled in, and opens nothing', async () => {
    const field = await account()
    burst('7K3M9Q2TX', 8, field)
    press('Enter', 8, field)
    await flushPromises()
    expect(field.value).toBe('')
    expect(usePostingStore().notice).toContain('7K3 M9Q 2TX was scanned.')
    expect(useRouter().currentRoute.value.path).toBe('/account')
  })

  it('opens its cylinder where nothing is filled in', async () => {
    await account()
    const push = vi.spyOn(useRouter(), 'push').mockResolvedValue(undefined)
    burst('7K3M9Q2TX')
    press('Enter', 8)
    await flushPromises()
    expect(push).toHaveBeenCalledWith('/c/7k3m9q2tx')
    push.mockRestore()
  })
})
