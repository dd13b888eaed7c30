import { CONDITION_WORDS } from '../custody/words'
import { dayAfter, dayBefore, formatWholeDay, type Day } from '../quantity/day'
import { formatRate, holdsOn, latestFirst, type DatedPrice, type Priced } from './price'

/** From a day to another one price counts, or none. */
export interface PricePeriod { fromDay: Day, untilDay: Day | null, price: DatedPrice | null }

/** The prices of one refrigerant in one condition as they follow each other. */
export interface PriceLine extends Priced {
  periods: PricePeriod[]
  /** What counts on the day asked about; null where none does. */
  now: PricePeriod | null
  /** What follows upon it, where something does. */
  next: PricePeriod | null
  /** Days without a price, and days for which two were recorded, in words. */
  remarks: string[]
}

/** Prices by refrigerant and condition, as they stand on a day and in what follows; the named refrigerants first. */
export function priceLines(prices: readonly DatedPrice[], today: Day): PriceLine[] {
  const groups = new Map<string, DatedPrice[]>()
  for (const price of prices) {
    const key = JSON.stringify([price.refrigerant, price.condition])
    groups.set(key, [...groups.get(key) ?? [], price])
  }
  return [...groups.values()].map(group => lineOf(group, today)).sort(byName)
}

/** What a price is for, in words. @example pricedWords({ refrigerant: null, condition: 'mixed' }) // 'any refrigerant, mixed' */
export function pricedWords({ refrigerant, condition }: Priced): string {
  return `${refrigerant ?? (condition === 'mixed' ? 'any refrigerant' : 'nobody has named it')}, ${conditionWord(condition)}`
}

/** A condition as people read it. */
export function conditionWord(condition: string): string {
  return Object.hasOwn(CONDITION_WORDS, condition) ? CONDITION_WORDS[condition as keyof typeof CONDITION_WORDS] : condition
}

function lineOf(group: readonly DatedPrice[], today: Day): PriceLine {
  const periods = periodsOf(group)
  const at = periods.findIndex(period => holdsOn(period, today))
  const [{ refrigerant, condition }] = group as [DatedPrice]
  return {
    refrigerant, condition, periods,
    now: periods[at]?.price ? periods[at] : null,
    next: at === -1 ? periods.find(({ fromDay }) => fromDay > today) ?? null : periods[at + 1] ?? null,
    remarks: [...gaps(periods), ...overlaps(group)],
  }
}

function periodsOf(group: readonly DatedPrice[]): PricePeriod[] {
  const edges = [...new Set(group.flatMap(({ fromDay, untilDay }) => untilDay === null ? [fromDay] : [fromDay, dayAfter(untilDay)]))].sort()
  const periods: PricePeriod[] = []
  edges.forEach((fromDay, index) => {
    const price = group.filter(one => holdsOn(one, fromDay)).sort(latestFirst)[0] ?? null
    const next = edges[index + 1]
    const untilDay = next === undefined ? null : dayBefore(next)
    const last = periods.at(-1)
    if (last && last.price?.id === price?.id) last.untilDay = untilDay
    else periods.push({ fromDay, untilDay, price })
  })
  return periods
}

function gaps(periods: readonly PricePeriod[]): string[] {
  return periods.filter(({ price }) => price === null).map(({ fromDay, untilDay }) => untilDay === null
    ? `No price from ${formatWholeDay(fromDay)} on.`
    : `No price from ${formatWholeDay(fromDay)} to ${formatWholeDay(untilDay)}.`)
}

// A price without an end gives way to the next: only where an end was said do two of them contradict each other.
function overlaps(group: readonly DatedPrice[]): string[] {
  const ordered = [...group].sort((a, b) => latestFirst(b, a))
  return ordered.flatMap((later, index) => ordered.slice(0, index).flatMap((earlier) => {
    if (earlier.untilDay === null && later.untilDay === null) return []
    if (earlier.untilDay !== null && earlier.untilDay < later.fromDay) return []
    const until = [earlier.untilDay, later.untilDay].filter(day => day !== null).sort()[0]!
    const again = later.untilDay !== null && (earlier.untilDay === null || earlier.untilDay > later.untilDay) ? ' The other one counts again after it.' : ''
    return [`Two prices from ${formatWholeDay(later.fromDay)} to ${formatWholeDay(until)}: ${formatRate(later.rate)} counts, which ${later.fromDay === earlier.fromDay ? 'was recorded later' : 'begins later'}.${again}`]
  }))
}

function byName(a: PriceLine, b: PriceLine): number {
  if ((a.refrigerant === null) !== (b.refrigerant === null)) return a.refrigerant === null ? 1 : -1
  const order = Object.keys(CONDITION_WORDS)
  return (a.refrigerant ?? '').localeCompare(b.refrigerant ?? '', 'en', { numeric: true }) || order.indexOf(a.condition) - order.indexOf(b.condition)
}
