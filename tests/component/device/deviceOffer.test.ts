import { mountSuspended } from '@nuxt/test-utils/runtime'
import { afterEach, describe, expect, it } from 'vitest'
import { defineComponent, h } from 'vue'
import { useDeviceOffer } from '~~/composables/useDeviceOffer'
import { useInstallationStore } from '~~/stores/installation'
import { usePostingStore } from '~~/stores/posting'

let pages = 0
const toAnotherPage = () => useRouter().push(`/?page=${++pages}`)

/** What is offered, as a page has it that stands. */
async function offering() {
  let offered: ReturnType<typeof useDeviceOffer>
  const wrapper = await mountSuspended(defineComponent({
    setup() {
      offered = useDeviceOffer()
      return () => h('p')
    },
  }))
  return {
    ...offered!,
    end() {
      offered.end()
      wrapper.unmount()
    },
  }
}

afterEach(() => {
  localStorage.clear()
  Reflect.deleteProperty(navigator, 'standalone')
  useInstallationStore().isByShareSheet = false
  usePostingStore().recorded = 0
})

describe('to be installed', () => {
  it('is asked after the first recorded event, with the next page, and once', async () => {
    // As Safari on a phone says it of a page that is not on the home screen; heard already, or within these two seconds.
    Object.defineProperty(navigator, 'standalone', { value: false, configurable: true })
    useInstallationStore().isByShareSheet = true
    const { offer, close, end } = await offering()
    await toAnotherPage()
    expect(offer.value).toBeNull()
    usePostingStore().recorded = 1
    expect(offer.value).toBeNull()
    await toAnotherPage()
    expect(offer.value?.text).toContain('Share, then Add to Home Screen')
    expect(offer.value?.action).toBeNull()
    close()
    await toAnotherPage()
    expect(offer.value).toBeNull()
    end()
    const later = await offering()
    await toAnotherPage()
    expect(later.offer.value).toBeNull()
    later.end()
  })

  it('is asked of nobody whose browser has no way to it', async () => {
    usePostingStore().recorded = 1
    const { offer, end } = await offering()
    await toAnotherPage()
    expect(offer.value).toBeNull()
    end()
  })
})
