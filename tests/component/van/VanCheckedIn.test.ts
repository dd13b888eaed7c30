import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import VanCheckedIn from '~~/components/van/VanCheckedIn.vue'
import { cylinderRow } from '../../helpers/cylinderRow'

const props = {
  vanName: 'Van 3', expected: 3, shopName: 'North shop', toShop: ['JN7 4RQ QM5'], aboard: ['PPQ P03 ET9'], missing: [cylinderRow()],
  by: 'Checked by Wes, 1 Dec 13:45', timeZone: 'America/Chicago', now: Date.UTC(2026, 11, 1, 19, 45),
}

describe('the sheet of a check-in', () => {
  it('counts and names what came off the van and what stays on it', async () => {
    const sheet = await mountSuspended(VanCheckedIn, { props })
    expect(sheet.text()).toContain('1 to North shop, 1 stays aboard, 1 not found.')
    expect(sheet.findAll('dl > div').map(line => [line.get('dt').text(), line.get('dd').text()])).toEqual([['To North shop', 'JN7 4RQ QM5'], ['Stays aboard', 'PPQ P03 ET9']])
  })

  it('names nothing where nothing came', async () => {
    const sheet = await mountSuspended(VanCheckedIn, { props: { ...props, toShop: [], aboard: [] } })
    expect(sheet.text()).toContain('0 to North shop, 0 stay aboard')
    expect(sheet.find('dl').exists()).toBe(false)
  })
})
