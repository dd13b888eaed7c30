import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import BalanceAccount from '~~/components/balance/BalanceAccount.vue'
import type { BalanceAccount as Account, RefrigerantBalance } from '~~/utils/contract/massBalance'
import { MOVEMENT_CAUSES, type MovementCause } from '~~/utils/custody/movement'
import { allByRole, byRole } from '../../helpers/roles'

const POUND = 453.59237
const pounds = (count: number) => Math.round(count * POUND)

function account(opening: number, moved: Partial<Record<MovementCause, number>>, changes: Partial<Account> = {}): Account {
  const closing = opening + Object.values(moved).reduce((sum, grams) => sum + grams, 0)
  return {
    openingGrams: opening,
    causes: MOVEMENT_CAUSES.map(cause => ({ cause, grams: moved[cause] ?? 0, movements: cause in moved ? 1 : 0 })),
    apart: { grams: 0, movements: 0 },
    closingGrams: closing,
    unexplained: { grams: moved.weighing ?? 0, uncertaintyGrams: pounds(0.3), isMore: false },
    stock: { opening: { grams: opening, uncertaintyGrams: 0, notKnown: 0 }, closing: { grams: closing, uncertaintyGrams: pounds(0.2), notKnown: 0 } },
    agrees: true,
    ...changes,
  }
}

async function mount(all: Account, more: Partial<RefrigerantBalance> = {}) {
  const wrapper = await mountSuspended(BalanceAccount, {
    props: {
      balance: { refrigerant: 'R-22', account: all, owners: [{ owner: null, account: all }], ...more },
      unit: 'lb',
      behind: line => `/behind/${line}`,
      ofOwner: ownerId => `/of/${ownerId ?? 'own'}`,
    },
  })
  return {
    text: wrapper.text().replaceAll(/\s+/g, ' '),
    rows: wrapper.findAll('dl > div').map(row => `${row.find('dt').text().replaceAll(/\s+/g, ' ')} | ${row.find('dd').text()}`),
    links: allByRole(wrapper.element, 'link').map(link => link.getAttribute('href')),
    root: wrapper.element,
  }
}

describe('the account of a refrigerant', () => {
  const usual = account(pounds(20), { recovered: pounds(8), shipped: -pounds(12), weighing: -pounds(0.2) })

  it('begins with the opening stock, names every cause once and ends with the closing stock', async () => {
    const { rows } = await mount(usual)
    expect(rows).toEqual([
      'Opening stock | 20.0',
      'Recovered of R-22, 1 movement | +8.0',
      'Shipped for reclaim of R-22, 1 movement | −12.0',
      'Weighed otherwise than the log of R-22, 1 movement | −0.2',
      expect.stringMatching(/^First known; Received with cylinders; .*; Sampled; .*; Practice and not countersigned \| nothing$/),
      'Closing stock | 15.8',
    ])
    expect(rows[4]!.split('; ')).toHaveLength(18 - 3 + 1)
  })

  it('says in one word where nothing moved at all', async () => {
    expect((await mount(account(pounds(20), {}))).rows).toEqual(['Opening stock | 20.0', 'By any cause | nothing', 'Closing stock | 20.0'])
  })

  it('leads from a cause that moved something to its movements, and from no other', async () => {
    expect((await mount(usual)).links).toEqual(['/behind/recovered', '/behind/shipped', '/behind/weighing'])
  })

  it('says with what no cause explains whether the scales could tell it apart', async () => {
    expect((await mount(usual)).text).toMatch(/No cause explains ?−0\.2 lb ± 0\.3 lb ?within what the scales can tell apart/)
    const more = account(0, { weighing: -pounds(2) }, { unexplained: { grams: -pounds(2), uncertaintyGrams: pounds(0.3), isMore: true } })
    expect((await mount(more)).text).toMatch(/No cause explains ?−2\.0 lb ± 0\.3 lb ?more than the scales can tell apart/)
  })

  it('counts cylinders that nobody has weighed beside the sum', async () => {
    const closing = { grams: 0, uncertaintyGrams: 0, notKnown: 2 }
    const { text } = await mount(account(0, {}, { stock: { opening: closing, closing } }))
    expect(text).toContain('2 cylinders whose contents are not known are not in this sum.')
    expect((await mount(usual)).text).not.toContain('not known')
  })

  it('shows an account that does not agree with the cylinders as a fault', async () => {
    const closing = { grams: usual.closingGrams - 45, uncertaintyGrams: 0, notKnown: 0 }
    const { root } = await mount({ ...usual, agrees: false, stock: { ...usual.stock, closing } })
    expect(byRole(root, 'alert').textContent).toContain('The books do not agree with the cylinders.')
    expect(byRole(root, 'alert').textContent).toContain('-45 g apart')
    expect(allByRole((await mount(usual)).root, 'alert')).toEqual([])
  })

  it('tells what is unknown or mixed by its name, and leads to each of several owners', async () => {
    const heron = { id: 'f1', name: 'Heron Foods' }
    const { text, links } = await mount(usual, { refrigerant: null, owners: [{ owner: null, account: usual }, { owner: heron, account: usual }] })
    expect(text).toContain('Unknown or mixed')
    expect(text).toContain('Heron Foods')
    expect(links.slice(-2)).toEqual(['/of/own', '/of/f1'])
  })
})
