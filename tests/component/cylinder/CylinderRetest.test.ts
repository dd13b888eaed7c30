import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import CylinderRetest from '~~/components/cylinder/CylinderRetest.vue'
import type { RequalificationView, RetestMark } from '~~/utils/custody/cylinderView'
import { allByRole } from '../../helpers/roles'

const TESTED: RequalificationView = {
  lastMonth: '2022-03', intervalMonths: 60, dueMonth: '2027-03', state: 'in-date', choice: null,
  basis: 'Tested March 2022; due 60 months later by 49 CFR 180.209(a), Table 1, for DOT-4BA.',
}

async function mount(changes: Partial<RequalificationView> = {}, marks: RetestMark[] = [], nowMs = Date.UTC(2025, 5, 1), rejected = false) {
  return await mountSuspended(CylinderRetest, {
    props: { requalification: { ...TESTED, ...changes }, marks, nowMs, timeZone: 'America/Chicago', soonDays: 120, rejected },
  })
}

describe('the retest of a cylinder', () => {
  it('draws the mark that counts, not the latest', async () => {
    const wrapper = await mount({}, [{ month: '2022-03', rin: 'A123' }, { month: '2024-05', rin: 'B456', suffix: 'E' }])
    expect(allByRole(wrapper.element, 'img').map(picture => picture.getAttribute('aria-label'))).toContain('Tested March 2022 by RIN A123, no suffix: volumetric expansion test')
    expect(wrapper.html()).not.toContain('B456')
  })

  it('draws none where the month it was made counts', async () => {
    expect((await mount({ lastMonth: '2021-01' })).html()).not.toContain('Tested January 2021')
  })

  it('says in words by what it falls due, and how late it is', async () => {
    const late = await mount({ state: 'overdue' }, [], Date.UTC(2027, 3, 1, 18))
    expect(late.text()).toContain('Retest was due: end of March 2027')
    expect(late.text()).toContain('1 day late')
    expect(late.text()).toContain(TESTED.basis)
  })

  it('asks no test of a specification that has none, refillable or not', async () => {
    const wrapper = await mount({ state: 'not-required', dueMonth: null, intervalMonths: null, basis: 'No test is asked of a DOT-4L (49 CFR 180.209(a), Table 1).' })
    expect(wrapper.text()).toContain('No retest is asked of it')
    expect(wrapper.text()).toContain('DOT-4L')
  })

  it('gives no date and no tick to one that was rejected at its test', async () => {
    const ticks = (html: string) => html.split('var(--ok)').length - 1
    expect(ticks((await mount()).html())).toBe(1)
    const wrapper = await mount({}, [], undefined, true)
    expect(wrapper.text()).toContain('Rejected at its last test')
    expect(wrapper.text()).not.toMatch(/end of|months|due/)
    expect(ticks(wrapper.html())).toBe(0)
  })

  it('shows what the paragraph of the owner\'s choice asks', async () => {
    const wrapper = await mount({ choice: { paragraph: '180.209(e)', reason: 'coated', from: null } })
    await expect.poll(() => wrapper.text()).toContain('Coated outside against corrosion.')
  })
})
