import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import MailLetter from '~~/components/mail/MailLetter.vue'
import type { MailLine } from '~~/utils/contract/mail'

const LETTER: MailLine = {
  id: 'letter', recipient: 'dock@tarnbeck.example', subject: 'Papers of shipment 0004', body: 'Hello', createdAt: '2026-12-01T10:00:00.000Z', sentAt: null, error: null,
  attachments: [{ position: 0, name: 'bill-of-lading-0004.pdf', bytes: 20_000 }], isWhole: true,
}
const shown = (given: Partial<MailLine>, maySend = true) => mountSuspended(MailLetter, { props: { letter: { ...LETTER, ...given }, when: 'today', maySend } })

describe('a kept letter', () => {
  it('has its papers to save, and is sent from here where it stayed inside or failed', async () => {
    const kept = await shown({})
    expect(kept.get('a').attributes()).toMatchObject({ href: '/api/mail/letter/attachments/0', download: 'bill-of-lading-0004.pdf' })
    await kept.get('button').trigger('click')
    expect(kept.emitted('send')).toHaveLength(1)
    expect((await shown({ error: 'No such mailbox' })).get('button').text()).toBe('Send it again')
  })

  it('is not sent twice, nor without a mail server, nor without the link that was its reader\'s alone', async () => {
    expect((await shown({ sentAt: '2026-12-01T10:00:01.000Z', body: null })).find('button').exists()).toBe(false)
    expect((await shown({}, false)).find('button').exists()).toBe(false)
    const linkless = await shown({ isWhole: false })
    expect(linkless.find('button').exists()).toBe(false)
    expect(linkless.text()).toContain('Make a new link')
  })
})
