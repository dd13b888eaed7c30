import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import SettlementTable from '~~/components/settlement/SettlementTable.vue'
import type { Dispute } from '~~/utils/contract/settlement'
import { settlementCredit } from '~~/utils/settlement/credit'
import { allByRole, byRole } from '../../helpers/roles'
import { settlementLine } from '../../helpers/settlementLine'

const TAKEN = { acceptedNet: { unit: 'lb' as const, value: 12 }, rate: { mills: 2_400, per: 'lb' as const }, grade: 'A', outcome: 'taken-over' as const }
const LINES = [settlementLine('a', { ...TAKEN, theirGross: { unit: 'lb', value: 40 } }), settlementLine('b')]
const NO_STATEMENT = { number: null, day: null, others: [], totalCents: null }
const ARGUED: Dispute = { id: 'd', about: 'net', cylinderId: 'a', isByFigures: true, isOpen: true, outcome: null, history: [] }

async function rows() {
  const credit = settlementCredit({ lines: LINES.map(line => ({ ...line, cylinderId: line.cylinder.id })), statement: NO_STATEMENT, unexpected: [] })
  const table = await mountSuspended(SettlementTable, { props: { lines: LINES, credit, disputes: [ARGUED], unit: 'lb' as const } })
  const drawn = byRole(table.element.parentElement!, 'table', 'Their figures beside ours')
  return [...drawn.querySelectorAll('tbody tr, tfoot tr')].map(row => [...row.querySelectorAll('th, td')].map(cell => cell.textContent!.trim().replace(/\s+/g, ' ')))
}

describe('the table of a settlement', () => {
  it('shows the four weights, by how much they differ, and what follows from them', async () => {
    const [first] = await rows()
    expect(first!.slice(2)).toEqual(['R-22, clean', '40.0', '40.0', '12.5', '12.0', 'net −0.5 lb', 'A', '$2.40 a lb', '$28.80', 'Taken over, in dispute'])
  })

  it('shows what is not known as a dash, and never as nothing', async () => {
    const [, second, foot] = await rows()
    expect(second!.slice(2)).toEqual(['R-22, clean', '40.0', '–', '12.5', '–', '–', '–', '–', '–', 'not said'])
    expect(foot).toEqual(['All 2 cylinders', '80.0', '40.0of 1', '25.0', '12.0of 1', '1 without a credit yet', '$28.80', ''])
  })

  it('tells of a difference by a shape and a word', async () => {
    const credit = settlementCredit({ lines: [], statement: NO_STATEMENT, unexpected: [] })
    const table = await mountSuspended(SettlementTable, { props: { lines: LINES, credit, disputes: [], unit: 'lb' as const } })
    const cell = allByRole(table.element.parentElement!, 'table')[0]!.querySelector('tbody tr td:nth-child(8)')!
    expect(cell.querySelector('svg')).not.toBeNull()
  })
})
