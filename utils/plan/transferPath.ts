import { queryText } from '../address/queryText'
import type { PlanTask } from '../contract/plans'

/** The form of a transfer, with the other cylinder and what the plan says filled in. */
export function transferPath(planNumber: number, { fromId, toId, netGrams }: Pick<PlanTask, 'fromId' | 'toId' | 'netGrams'>): { path: string, query: Record<string, string> } {
  return {
    path: `/c/${fromId}/act/transferred`,
    query: { ...(toId !== null && { other: toId }), plan: String(planNumber), ...(netGrams !== null && { grams: String(netGrams) }) },
  }
}

/** What a plan says of the transfer that an address leads to, as {@link transferPath} wrote it; null where none led there. */
export function plannedTransfer(query: Readonly<Record<string, unknown>>): { plan: string, grams: number, draft: { gives: true, otherId: string } } | null {
  const [plan, otherId, grams] = ['plan', 'other', 'grams'].map(name => queryText(query, name))
  if (!/^\d{1,9}$/.test(plan!) || !/^[\da-f-]{36}$/.test(otherId!) || !/^\d{1,9}$/.test(grams!)) return null
  return { plan: plan!, grams: Number(grams), draft: { gives: true, otherId: otherId! } }
}
