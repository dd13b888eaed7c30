const MS_PER_DAY = 86_400_000

/** Calendar days from one instant to another in a time zone: 0 on the same day. */
export function daysSince(thenMs: number, nowMs: number, timeZone: string): number {
  const format = new Intl.DateTimeFormat('en-US', { timeZone, calendar: 'gregory', year: 'numeric', month: 'numeric', day: 'numeric' })
  return Math.round((dayOf(format, nowMs) - dayOf(format, thenMs)) / MS_PER_DAY)
}

function dayOf(format: Intl.DateTimeFormat, ms: number): number {
  const parts = format.formatToParts(ms)
  const part = (type: 'year' | 'month' | 'day') => Number(parts.find(one => one.type === type)?.value)
  return Date.UTC(part('year'), part('month') - 1, part('day'))
}
