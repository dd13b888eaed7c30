import { BALANCE_LINES, type BalanceLine } from '../contract/balanceLines'
import { isDay } from '../quantity/day'
import { daysOf, NAMED_PERIODS, type Days, type NamedPeriod } from './period'

/** What the balance's address asks for. */
export interface BalanceAddress {
  /** A named period, or the days themselves. */
  period: NamedPeriod | 'days'
  /** As they were written, where the period is days. */
  days: Days | null
  refrigerant: string | null
  owner: string | null
  line: BalanceLine | null
}

type Query = Record<string, string | null | (string | null)[] | undefined>

/** Reads an address; what it does not understand counts for nothing, and without a period it is this month. */
export function readBalanceAddress(query: Query): BalanceAddress {
  const text = (key: string) => typeof query[key] === 'string' ? query[key] : null
  const [from, to] = [text('from'), text('to')]
  const days = from !== null && to !== null && isDay(from) && isDay(to) ? { from, to } : null
  return {
    period: days ? 'days' : NAMED_PERIODS.find(name => name === text('period')) ?? 'this-month',
    days,
    refrigerant: text('refrigerant'),
    owner: text('owner'),
    line: BALANCE_LINES.find(line => line === text('line')) ?? null,
  }
}

/** The query of an address; what is left out there is left out here. */
export function balanceAddressQuery({ period, days, refrigerant, owner, line }: BalanceAddress): Record<string, string> {
  const said = { period: period === 'days' ? null : period, ...(period === 'days' ? days : null), refrigerant, owner, line }
  return Object.fromEntries(Object.entries(said).filter((one): one is [string, string] => typeof one[1] === 'string'))
}

/** What an address asks the server for. */
export function balanceRequest({ period, days, refrigerant, owner }: BalanceAddress, nowMs: number, timeZone: string) {
  const asked = period === 'days' && days ? days : daysOf(period === 'days' ? 'this-month' : period, nowMs, timeZone)
  return { ...asked, refrigerant: refrigerant ?? undefined, owner: owner ?? undefined }
}
