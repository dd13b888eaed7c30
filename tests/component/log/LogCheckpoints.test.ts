import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LogCheckpoints from '~~/components/log/LogCheckpoints.vue'
import LogExport from '~~/components/log/LogExport.vue'
import { byRole } from '../../helpers/roles'

const CHECKPOINT = {
  number: 12, at: '2026-12-01T17:00:00.000Z', seq: 4_812, events: 4_812, cylinders: 180, root: 'CsUYapGGPo4dkMgIAUqom/Xajj7h2fB2MPA3j2jxq2I=', hash: 'ab', askedBy: null,
}

describe('the checkpoints', () => {
  it('are listed with who asked for them, the beginning of the root, and the text to keep', async () => {
    const list = await mountSuspended(LogCheckpoints, {
      props: { checkpoints: [CHECKPOINT, { ...CHECKPOINT, number: 11, askedBy: { id: 'p1', name: 'Ada Example' } }], when: (ms: number) => new Date(ms).toISOString() },
    })
    const cells = list.findAll('tbody tr').map(row => row.findAll('th, td').map(cell => cell.text()))
    expect(cells).toEqual([
      ['12', '2026-12-01T17:00:00.000Z', 'daily', '4,812', '180', 'CsUYapGGPo4d…', 'Download'],
      ['11', '2026-12-01T17:00:00.000Z', 'Ada Example', '4,812', '180', 'CsUYapGGPo4d…', 'Download'],
    ])
    const [link] = list.findAll('tbody a')
    expect(link?.attributes('href')).toBe('/api/log/checkpoints/12')
  })
})

describe('checking without us', () => {
  it('takes one command that names the public key', async () => {
    const key = 'custody-log/one+c74f20a3+ARpc2QcUPDhMQegwxbzhKqiBfsVkmqq/LDE4izWy10TW'
    const part = await mountSuspended(LogExport, { props: { publicKey: key } })
    expect(part.text()).toContain(`node check-custody-log.mjs custody-log.ndjson --key '${key}'`)
    expect(byRole(part.element, 'link', 'Download the log').getAttribute('href')).toBe('/api/log/export')
    expect(byRole(part.element, 'link', 'Download the checker').getAttribute('href')).toBe('/check-custody-log.mjs')
  })
})
