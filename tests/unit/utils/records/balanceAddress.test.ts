import { describe, expect, it } from 'vitest'
import { balanceAddressQuery, balanceRequest, readBalanceAddress } from '~~/utils/records/balanceAddress'

const NOW = Date.parse('2026-12-15T17:00:00Z')

describe('the address of the balance', () => {
  it('is this month where it says nothing, or nothing that is understood', () => {
    expect(readBalanceAddress({})).toEqual({ period: 'this-month', days: null, refrigerant: null, owner: null, line: null })
    expect(readBalanceAddress({ period: 'last-week', from: '2026-02-30', to: '2026-03-01', line: 'gone' })).toMatchObject({ period: 'this-month', days: null, line: null })
    expect(readBalanceAddress({ from: '2026-03-01' })).toMatchObject({ period: 'this-month', days: null })
  })

  it('is read as it was written', () => {
    for (const query of [
      { period: 'this-month' }, { period: 'last-month', refrigerant: 'R-22', owner: 'own' }, { from: '2026-03-01', to: '2026-03-09', line: 'drawn-other' },
    ]) expect(balanceAddressQuery(readBalanceAddress(query))).toEqual(query)
  })

  it('asks the server for days', () => {
    expect(balanceRequest(readBalanceAddress({ period: 'last-month', owner: 'own' }), NOW, 'America/Chicago'))
      .toEqual({ from: '2026-11-01', to: '2026-11-30', owner: 'own' })
    expect(balanceRequest(readBalanceAddress({ from: '2026-03-01', to: '2026-03-09' }), NOW, 'America/Chicago')).toEqual({ from: '2026-03-01', to: '2026-03-09' })
  })
})
