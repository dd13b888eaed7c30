import { expect, it } from 'vitest'
import { cylinderId } from '~~/tests/helpers/planFleet'
import { plannedTransfer, transferPath } from '~~/utils/plan/transferPath'

it('leads to the form of a transfer with what the plan says of it, and nothing else in the address does', () => {
  const { path, query } = transferPath(3, { fromId: cylinderId(0), toId: cylinderId(1), netGrams: 9_435 })
  expect(path).toBe(`/c/${cylinderId(0)}/act/transferred`)
  expect(plannedTransfer(query)).toEqual({ plan: '3', grams: 9_435, draft: { gives: true, otherId: cylinderId(1) } })
  expect(plannedTransfer({ ...query, other: 'somewhere' })).toBeNull()
  expect(plannedTransfer({ ...query, grams: '-5' })).toBeNull()
  expect(plannedTransfer({})).toBeNull()
})
