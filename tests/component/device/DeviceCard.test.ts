import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import DeviceCard from '~~/components/device/DeviceCard.vue'
import { allByRole, byRole } from '../../helpers/roles'

const FRESH = { opensOffline: false, isUpdateReady: false, isInstalled: false, canInstall: false, isByShareSheet: false, storage: null }
const shown = (changes: Partial<InstanceType<typeof DeviceCard>['$props']> = {}) => mountSuspended(DeviceCard, { props: { ...FRESH, ...changes } })

describe('what an account says of this device', () => {
  it('is unknown until the browser has told, and then nothing is offered', async () => {
    const card = await shown()
    expect(card.text()).toContain('this browser does not say')
    expect(allByRole(card.element, 'button')).toHaveLength(0)
  })

  it('says whether what is kept stays, how much it is, and asks for it where it may be cleared', async () => {
    const card = await shown({ opensOffline: true, storage: { isPersisted: false, usedBytes: 3_140_000, quotaBytes: 2_000_000_000 } })
    expect(card.text()).toContain('the browser may clear it when space runs out')
    expect(card.text()).toContain('3.1 of 2,000 MB')
    byRole(card.element, 'button', 'Ask the browser to keep it').click()
    expect(card.emitted('persist')).toHaveLength(1)
    await card.setProps({ storage: { isPersisted: true, usedBytes: 3_140_000, quotaBytes: null } })
    expect(card.text()).toContain('stays until you clear it')
    expect(allByRole(card.element, 'button')).toHaveLength(0)
  })

  it('installs by one button where the browser lets us ask, and tells the way where it does not', async () => {
    const card = await shown({ canInstall: true })
    byRole(card.element, 'button', 'Install on this device').click()
    expect(card.emitted('install')).toHaveLength(1)
    await card.setProps({ canInstall: false, isByShareSheet: true })
    expect(allByRole(card.element, 'button')).toHaveLength(0)
    expect(card.text()).toContain('Share, then Add to Home Screen')
  })

  it('offers the version that waits', async () => {
    const card = await shown({ isUpdateReady: true })
    byRole(card.element, 'button', 'Take the new version').click()
    expect(card.emitted('update')).toHaveLength(1)
  })
})
