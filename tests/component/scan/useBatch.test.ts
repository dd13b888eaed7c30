import { mountSuspended, registerEndpoint } from '@nuxt/test-utils/runtime'
import { flushPromises } from '@vue/test-utils'
import { createError } from 'h3'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { useBatch } from '~~/composables/useBatch'
import type { CylinderRow, CylinderView } from '~~/utils/contract/custody'
import { did, registered, STAMP, viewAfter } from '../../helpers/custody'
import { cylinderRow } from '../../helpers/cylinderRow'

const CODE = '7K3M9Q2TX'
const OTHER_CODE = '000000000'

function labelled(id: string, serial: string | null, code: string, isOnTwo = false): CylinderView {
  return { ...viewAfter([registered({ stamp: { ...STAMP, serial } }), did('labelled', { code })], { codesOnTwo: new Set(isOnTwo ? [code] : []) }), id }
}

let fleet: CylinderView[] = []
registerEndpoint('/api/cylinders', () => ({
  items: fleet.map((view): CylinderRow => cylinderRow({ id: view.id, serial: view.stamp?.serial ?? null, findingCodes: ['code-on-two'] })), nextCursor: null, total: fleet.length,
}))
for (const ref of ['first', 'second', 'stranger', CODE, OTHER_CODE]) {
  registerEndpoint(`/api/cylinders/${ref}`, () => {
    const found = fleet.find(view => view.id === ref || view.labelCode === ref)
    if (!found) throw createError({ statusCode: 404 })
    return found
  })
}

const wrappers: { unmount: () => void }[] = []
async function batch() {
  let made!: ReturnType<typeof useBatch>
  wrappers.push(await mountSuspended({
    setup() {
      made = useBatch('move test', () => ({ act: 'move', target: { id: 'shop', name: 'North shop', technicianId: null }, expected: null, supervisorId: null }))
      return () => null
    },
  }))
  await flushPromises()
  return made
}
const refs = (of: ReturnType<typeof useBatch>) => of.lines.value.map(({ ref: reference }) => reference)

beforeEach(() => localStorage.clear())
afterEach(() => wrappers.splice(0).forEach(wrapper => wrapper.unmount()))

describe('which of two cylinders with one code is meant in a batch', () => {
  beforeEach(() => {
    fleet = [labelled('first', 'K48213', CODE, true), labelled('second', null, CODE, true), labelled('stranger', 'K49999', OTHER_CODE, true)]
  })

  it('is the one whose serial ends so', async () => {
    const list = await batch()
    await list.add(CODE)
    expect(await list.choose(CODE, '8213')).toBe(true)
    expect(refs(list)).toEqual(['first'])
  })

  it('is never a third, whose own code is on two', async () => {
    const list = await batch()
    await list.add(CODE)
    expect(await list.choose(CODE, '9999')).toBe(false)
    expect(refs(list)).toEqual([CODE])
  })
})

describe('a batch that is open in two tabs', () => {
  it('never writes what it has from the other over what that one has written since', async () => {
    fleet = [labelled('first', 'K48213', CODE), labelled('second', 'K48777', OTHER_CODE)]
    const one = await batch()
    const other = await batch()
    await other.add(CODE)
    await flushPromises()
    toldToOthers()
    const key = keptUnder()
    localStorage.setItem(key, '"written since"')
    await vi.waitFor(() => expect(one.lines.value.map(({ found }) => found.is)).toEqual(['known']))
    await flushPromises()
    expect(localStorage.getItem(key)).toBe('"written since"')
  })

  const keptUnder = () => Object.keys(localStorage).find(name => name.endsWith('batch move test'))!

  /** What the browser tells the other tabs once one has written. */
  function toldToOthers() {
    const key = keptUnder()
    window.dispatchEvent(new StorageEvent('storage', { key, newValue: localStorage.getItem(key), storageArea: localStorage }))
  }

  it('is one list: what one scans, the other has, and neither loses any', async () => {
    fleet = [labelled('first', 'K48213', CODE), labelled('second', 'K48777', OTHER_CODE)]
    const one = await batch()
    await one.add(CODE)
    await flushPromises()
    const other = await batch()
    await other.add(OTHER_CODE)
    await flushPromises()
    toldToOthers()
    await vi.waitFor(() => expect(refs(one)).toEqual([OTHER_CODE, CODE]))
    expect(refs(other)).toEqual([OTHER_CODE, CODE])
    await vi.waitFor(() => expect(one.lines.value.every(({ found }) => found.is === 'known')).toBe(true))

    one.drop(CODE)
    await flushPromises()
    toldToOthers()
    await vi.waitFor(() => expect(refs(other)).toEqual([OTHER_CODE]))
    expect(refs(await batch())).toEqual([OTHER_CODE])
  })
})
