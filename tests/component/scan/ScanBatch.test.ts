import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import ScanBatch from '~~/components/scan/ScanBatch.vue'
import { did, filled, registered, VAN, viewAfter } from '~~/tests/helpers/custody'
import { batchLine, type BatchScan } from '~~/utils/batch/batchLine'

const LABEL = did('labelled', { code: '7K3M9Q2TX' })

function line(scan: Partial<BatchScan>, grossKg = 20) {
  const view = viewAfter([registered(), LABEL, filled('R-22', grossKg)])
  return batchLine({
    ref: '7K3M9Q2TX', scannedAt: '2026-07-02T12:00:00Z', found: { is: 'known', view }, keepReason: null, isChosen: false, sent: null, problem: null, ...scan,
  }, { act: 'load', target: { id: VAN, name: 'Van 12' }, expectedIds: null }, 'kg')
}

function mount(...lines: ReturnType<typeof line>[]) {
  return mountSuspended(ScanBatch, { props: { lines, unit: 'kg', wrongEndRef: null } })
}

describe('a line of a batch', () => {
  it('shows what is in the cylinder and its gross, and is taken off by one press', async () => {
    const list = await mount(line({}))
    expect(list.text()).toMatch(/7K3 M9Q 2TX.*R-22, room 8\.00.*20\.00/s)
    await list.get('button[aria-label="Take 7K3 M9Q 2TX off the list"]').trigger('click')
    expect(list.emitted('drop')).toEqual([['7K3M9Q2TX']])
  })

  it('takes a refused one only with a reason', async () => {
    const list = await mount(line({}, 29))
    expect(list.text()).toContain('Not this cylinder.')
    expect(list.findAll('button').find(button => button.text() === 'Keep it')!.attributes('disabled')).toBeDefined()
    await list.get('form').trigger('submit')
    expect(list.emitted('keep')).toBeUndefined()
    await list.get('input').setValue(' aboard already ')
    await list.get('form').trigger('submit')
    expect(list.emitted('keep')).toEqual([['7K3M9Q2TX', 'aboard already']])
  })

  it('says why the server did not record it, and keeps it', async () => {
    const list = await mount(line({ problem: { type: 'about:blank', title: 'Not yours', status: 403, detail: 'Another role records this.' } }))
    expect(list.text()).toContain('Not recorded. Another role records this.')
  })

  it('leads from a label on no cylinder to where it is bound', async () => {
    const list = await mount(line({ found: { is: 'unknown' } }))
    expect(list.get('a').attributes('href')).toBe('/scan?code=7K3M9Q2TX')
  })
})
