import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import LogVerdict from '~~/components/log/LogVerdict.vue'
import type { LogVerification } from '~~/utils/contract/log'
import { allByRole } from '../../helpers/roles'

const WHOLE: LogVerification = {
  ok: true, scope: 'all', checked: 4_812, cylinders: 180, damage: [], found: 0, checkpoints: 3, since: null, upTo: 3, verifiedAt: '2026-12-01T17:00:00.000Z',
}
const CHANGED = { kind: 'changed', cylinderId: '0198f000-0000-7000-8000-0000000000c1', version: 4, seq: 812, checkpoint: null, because: 'one of its columns was changed' }

async function shown(changes: Partial<LogVerification>) {
  return mountSuspended(LogVerdict, { props: { result: { ...WHOLE, ...changes }, at: '1 Dec 2026, 11:00' } })
}

describe('what verifying found', () => {
  it('is said with how much was checked', async () => {
    const text = (await shown({})).text()
    expect(text).toContain('Unbroken')
    expect(text).toContain('Checked 4,812 events of 180 cylinders, 3 checkpoints; 1 Dec 2026, 11:00.')
  })

  it('names the checkpoint that it began from', async () => {
    expect((await shown({ scope: 'since', since: 2, checked: 1, checkpoints: 3 })).text()).toContain('Checked 1 event since checkpoint 2, the ends of 180 cylinders, 3 checkpoints')
  })

  it('names each damage, and leads to the cylinder', async () => {
    const page = await shown({ ok: false, damage: [CHANGED, { ...CHANGED, kind: 'checkpoint-missing', cylinderId: null, version: null, seq: null, checkpoint: 2, because: 'it is missing' }], found: 7 })
    expect(page.text()).toContain('Broken')
    expect(page.text()).toMatch(/Version 4, number 812 of\s*0198f000-0000-7000-8000-0000000000c1\s*: one of its columns was changed\./)
    expect(page.text()).toContain('Checkpoint 2: it is missing.')
    expect(page.text()).toContain('And 5 more.')
    expect(allByRole(page.element, 'link').map(link => link.getAttribute('href'))).toEqual(['/c/0198f000-0000-7000-8000-0000000000c1'])
  })

  it('of the fleet against the log is not said of the log', async () => {
    expect((await shown({ scope: 'caches' })).text()).toContain('The fleet agrees with the log')
    const text = (await shown({ scope: 'caches', ok: false, damage: [{ ...CHANGED, kind: 'row-differs', version: null, seq: null, because: 'its row differs' }], found: 1 })).text()
    expect(text).toContain('The fleet differs from the log')
    expect(text).not.toContain('Broken')
  })
})
