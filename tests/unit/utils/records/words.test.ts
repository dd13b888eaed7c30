import { expect, it } from 'vitest'
import { BALANCE_LINES } from '~~/utils/contract/balanceLines'
import type { BalanceAccount } from '~~/utils/contract/massBalance'
import { MOVEMENT_CAUSES } from '~~/utils/custody/movement'
import { BALANCE_CSV_HEADS, balanceCsvRows } from '~~/utils/records/balanceCsv'
import { BALANCE_LINE_WORDS, periodWords } from '~~/utils/records/words'

it('names the days of a period, with both years where they differ', () => {
  expect(periodWords({ from: '2026-11-01', to: '2026-11-30' })).toBe('1 Nov to 30 Nov 2026')
  expect(periodWords({ from: '2025-12-31', to: '2026-01-01' })).toBe('31 Dec 2025 to 1 Jan 2026')
  expect(periodWords({ from: '2026-03-08', to: '2026-03-08' })).toBe('8 Mar 2026')
})

it('has words of its own for every line', () => {
  expect(new Set(BALANCE_LINES.map(line => BALANCE_LINE_WORDS[line].words)).size).toBe(19)
})

it('gives a table of values a cell under each head, and no name that a spreadsheet would reckon', () => {
  const stock = { grams: 700, uncertaintyGrams: 50, notKnown: 3 }
  const account: BalanceAccount = {
    openingGrams: 500, causes: MOVEMENT_CAUSES.map(cause => ({ cause, grams: cause === 'recovered' ? 300 : 0, movements: 0 })), apart: { grams: -100, movements: 1 },
    closingGrams: 700, unexplained: { grams: -20, uncertaintyGrams: 10, isMore: true }, stock: { opening: stock, closing: stock }, agrees: true,
  }
  const [row] = balanceCsvRows({ from: '2026-11-01', to: '2026-11-30', fromAt: '', untilAt: '' }, { refrigerant: null, account, owners: [{ owner: { id: 'f', name: '+Heron' }, account }] })
  const cell = (head: string) => row![BALANCE_CSV_HEADS.indexOf(head)]
  expect(row).toHaveLength(BALANCE_CSV_HEADS.length)
  expect(['Refrigerant', 'Owner', 'Opening stock, g', 'Recovered, g', 'Closing stock, g', 'No cause explains, g', 'Verdict', 'Cylinders not weighed', 'Agrees with the cylinders'].map(cell))
    .toEqual(['Unknown or mixed', '\'+Heron', 500, 300, 700, -20, 'more than the scales can tell apart', 3, 'yes'])
})
