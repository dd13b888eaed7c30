import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import KitCopyLine from '~~/components/kit/KitCopyLine.vue'
import KitWaitingLine from '~~/components/kit/KitWaitingLine.vue'
import ScanChanged from '~~/components/scan/ScanChanged.vue'

const NOON = new Date(2026, 6, 2, 12, 0).getTime()
const HOUR = 3_600_000

describe('what comes from the phone\'s copy', () => {
  it('says of when the copy is, by the phone\'s own clock', async () => {
    const today = await mountSuspended(KitCopyLine, { props: { of: NOON - HOUR, nowMs: NOON } })
    expect(today.text()).toBe('From this phone’s copy of today 11:00.')
    const before = await mountSuspended(KitCopyLine, { props: { of: NOON - 24 * HOUR, nowMs: NOON } })
    expect(before.text()).toBe('From this phone’s copy of yesterday 12:00.')
  })

  it('says how many events that wait are not in it', async () => {
    expect((await mountSuspended(KitWaitingLine, { props: { count: 1 } })).text()).toMatch(/^One event that waits on this phone is not in what is shown here/)
    expect((await mountSuspended(KitWaitingLine, { props: { count: 2 } })).text()).toMatch(/^2 events that wait on this phone are not in what is shown here/)
  })

  it('stands beside what has changed since, and not in its place', async () => {
    expect((await mountSuspended(ScanChanged, { props: { from: 'R-22, room for 13.2 lb of R-22' } })).text())
      .toBe('It has changed. This phone’s copy had: R-22, room for 13.2 lb of R-22. Below is what holds now.')
  })
})
