import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import CylinderMonthStrip from '~~/components/cylinder/CylinderMonthStrip.vue'
import { allByRole, byRole } from '../../helpers/roles'

describe('the month strip', () => {
  it('counts the late ones first and then twelve months, and filters by a press', async () => {
    const wrapper = await mountSuspended(CylinderMonthStrip, { props: { from: '2026-12', counts: { '2027-03': 1 }, lateCount: 2, picked: '2027-03' } })
    const cells = allByRole(wrapper.element, 'button')
    expect(cells).toHaveLength(13)
    expect(cells[0]!.getAttribute('aria-label')).toBe('2 late')
    const march = byRole(wrapper.element, 'button', '1 Mar, due by the end of March 2027')
    expect(march.getAttribute('aria-pressed')).toBe('true')
    march.click()
    byRole(wrapper.element, 'button', '2 late').click()
    expect(wrapper.emitted('pick')).toEqual([['2027-03'], ['late']])
  })

  it('fills a month within the warning time only', async () => {
    const wrapper = await mountSuspended(CylinderMonthStrip, { props: { from: '2026-12', counts: { '2027-03': 1, '2027-04': 1 }, soonMonths: 4 } })
    expect(byRole(wrapper.element, 'button', '1 Mar, due by the end of March 2027').className).toContain('bg-att')
    expect(byRole(wrapper.element, 'button', '1 Apr, due by the end of April 2027').className).not.toContain('bg-att')
  })

  it.each([
    ['2027-03', 'Due by the end of March 2027'],
    ['2026-09', 'Due by the end of September 2026, late'],
    ['2030-05', 'Due by the end of May 2030, later than the twelve months drawn'],
    [null, 'The due month is not known'],
  ])('says in words where one cylinder due in %s stands', async (mark, words) => {
    const wrapper = await mountSuspended(CylinderMonthStrip, { props: { from: '2026-12', mark } })
    expect(byRole(wrapper.element, 'img', words)).toBeTruthy()
  })
})
