import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import DockLinkCard from '~~/components/dock/DockLinkCard.vue'
import type { DockLink } from '~~/utils/contract/dock'

const LINK: DockLink = {
  id: '01935c2f-7d41-7c22-9f0a-0123456789ab', forWhom: 'Dock 2', createdAt: '2026-12-01T15:00:00Z', createdBy: 'Mona', expiresAt: '2026-12-31T15:00:00Z',
  revokedAt: null, revokedBy: null, state: 'open', firstUsedAt: null, lastEntryAt: null, entries: 0,
}
const PROPS = {
  links: [LINK], fresh: null, mayMake: true, isOpen: true, to: 'Tarnvale Reclaim', email: null, busy: false, problem: null,
  timeZone: 'America/Chicago', now: Date.UTC(2026, 11, 2),
}

describe('the links of a shipment to its dock', () => {
  it('are listed with whom they are for, until when they open, and what came over them', async () => {
    const used = { ...LINK, id: 'used', forWhom: 'Dock 3', firstUsedAt: '2026-12-01T16:00:00Z', lastEntryAt: '2026-12-01T17:30:00Z', entries: 1 }
    const gone = { ...LINK, id: 'gone', forWhom: 'Dock 4', state: 'revoked' as const, revokedAt: '2026-12-01T18:00:00Z', revokedBy: 'Mona' }
    const card = await mountSuspended(DockLinkCard, { props: { ...PROPS, links: [LINK, used, gone] } })
    const [first, second, third] = card.findAll('li').map(line => line.text())
    expect(first).toContain('Made 1 Dec 09:00 by Mona, until 31 Dec 09:00; not opened yet')
    expect(second).toContain('1 entry, the last 1 Dec 11:30')
    expect(third).toContain('withdrawn 1 Dec 12:00 by Mona')
    expect(card.findAll('li')[2]!.find('button').exists()).toBe(false)
  })

  it('offers neither making nor withdrawing to whoever may not dispatch', async () => {
    const card = await mountSuspended(DockLinkCard, { props: { ...PROPS, mayMake: false } })
    expect(card.findAll('button').map(button => button.text()).filter(text => /Make|Withdraw/.test(text))).toEqual(['Withdraw'])
    expect(card.get('dialog').attributes('open')).toBeUndefined()
    expect(card.get('li').find('button').exists()).toBe(false)
  })

  it('are made for somebody, for some days, and mailed where an address is typed', async () => {
    const card = await mountSuspended(DockLinkCard, { props: PROPS })
    await card.findAll('button').find(button => button.text() === 'Make a link')!.trigger('click')
    expect(card.get('input').element.value).toBe('Tarnvale Reclaim, dock')
    await card.get('input').setValue('')
    await card.get('input[type="checkbox"]').setValue(true)
    await card.get('form').trigger('submit')
    expect(card.text()).toContain('Say whom it is for.')
    expect(card.text()).toContain('Type the address that it goes to.')
    expect(card.emitted('make')).toBeUndefined()
    await card.get('input').setValue('Dock 5')
    await card.get('input[type="email"]').setValue('dock@tarnvale.example')
    await card.get('select').setValue('7')
    await card.get('form').trigger('submit')
    expect(card.emitted('make')).toEqual([[{ forWhom: 'Dock 5', days: 7, email: 'dock@tarnvale.example' }]])
  })

  it('are withdrawn only after a second look', async () => {
    const card = await mountSuspended(DockLinkCard, { props: PROPS })
    await card.get('button[aria-label="Withdraw the link for Dock 2"]').trigger('click')
    expect(card.emitted('revoke')).toBeUndefined()
    await card.get('dialog').findAll('button').find(button => button.text() === 'Withdraw')!.trigger('click')
    expect(card.emitted('revoke')).toEqual([[LINK.id]])
  })

  it('show the address of a new one this once, also as a symbol, and say that no mail went', async () => {
    const url = `https://book.quillfen.example/d/${'A'.repeat(60)}`
    const card = await mountSuspended(DockLinkCard, { props: { ...PROPS, fresh: { link: LINK, url, mail: 'kept' } } })
    expect(card.get('code').text()).toBe(url)
    expect(card.get('svg[role="img"]').attributes('aria-label')).toBe('The link as a symbol for a phone’s camera')
    expect(card.text()).toContain('No mail server is set. Hand the link over yourself.')
  })
})
