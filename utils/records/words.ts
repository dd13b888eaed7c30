import type { BalanceLine } from '../contract/balanceLines'
import { formatDay } from '../quantity/instant'
import type { Days } from './period'

/** A line of the balance as people say it, and what it takes in where that is not plain. */
export interface LineWords { words: string, note?: string }

/** The words of each line that has movements behind it. */
export const BALANCE_LINE_WORDS: Record<BalanceLine, LineWords> = {
  'opening': { words: 'First known', note: 'contents that nobody had weighed, or that came back into stock' },
  'recovered': { words: 'Recovered' },
  'received-with': { words: 'Received with cylinders' },
  'returned-with': { words: 'Returned with cylinders' },
  'drawn-same-system': { words: 'Drawn, back into the same system' },
  'drawn-same-owner': { words: 'Drawn, into the same owner’s equipment' },
  'drawn-other': { words: 'Drawn, for another purpose' },
  'sampled': { words: 'Sampled' },
  'renamed': { words: 'Renamed', note: 'to or from another refrigerant or owner' },
  'transferred-in': { words: 'Transferred in' },
  'transferred-out': { words: 'Transferred out' },
  'shipped': { words: 'Shipped for reclaim' },
  'lost': { words: 'Lost' },
  'emptied-loss': { words: 'Lost in emptying' },
  // Both move nothing: a missing cylinder counts as what it held when it was last seen.
  'missing': { words: 'Missing' },
  'found': { words: 'Found' },
  'tare-change': { words: 'New tare weights' },
  'weighing': { words: 'Weighed otherwise than the log' },
  'apart': { words: 'Practice and not countersigned', note: 'left out of regulatory totals' },
}

/** What the account begins and ends with, and what no cause explains. */
export const OPENING_WORDS = 'Opening stock'
export const CLOSING_WORDS = 'Closing stock'
export const UNEXPLAINED_WORDS = 'No cause explains'

/** The refrigerant of an account as people say it. */
export function refrigerantWords(refrigerant: string | null): string {
  return refrigerant ?? 'Unknown or mixed'
}

/** Whose an account is. */
export function ownerWords(owner: { name: string } | null): string {
  return owner?.name ?? 'Our own'
}

/** Whether what no cause explains is more than the scales can tell apart. */
export function verdictWords({ isMore }: { isMore: boolean }): string {
  return isMore ? 'more than the scales can tell apart' : 'within what the scales can tell apart'
}

/** The days of a period. @example periodWords({ from: '2026-11-01', to: '2026-12-01' }) // '1 Nov to 1 Dec 2026' */
export function periodWords({ from, to }: Days): string {
  const last = `${dayWords(to)} ${to.slice(0, 4)}`
  if (from === to) return last
  const isOneYear = from.slice(0, 4) === to.slice(0, 4)
  return `${dayWords(from)}${isOneYear ? '' : ` ${from.slice(0, 4)}`} to ${last}`
}

// A day of the calendar is the same in every time zone.
function dayWords(day: string): string {
  return formatDay(Date.parse(`${day}T00:00:00Z`), 'UTC')
}
