import { isDay, type Day } from '../quantity/day'
import { readAmount } from './amountEntry'
import type { Priced, Rate } from './price'

/** A price as it is typed: an amount without a sign, and who pays it. */
export interface PriceTyped {
  /** Empty for contents whose refrigerant is mixed or not known. */
  refrigerant: string
  condition: string
  pays: 'they' | 'we'
  amount: string
  per: Rate['per']
  fromDay: string
  /** Empty where no end is said. */
  untilDay: string
}

/** A field that does not fit, by its path. */
export interface Fault { path: string, message: string }

/** A price as it was read. */
export interface PriceDraft extends Priced, Rate { fromDay: Day, untilDay: Day | null }

/** Far more than any refrigerant costs, so that more is a slip: our own bound, in thousandths. */
const MOST_MILLS = 10_000_000

/** Reads a price from its fields, or says beside each what is wrong. */
export function readPrice(typed: PriceTyped): { draft: PriceDraft, faults: [] } | { draft: null, faults: Fault[] } {
  const amount = readAmount(typed.amount, 3)
  const isNamed = typed.refrigerant !== ''
  const faults: Fault[] = [
    ...(typed.condition === '' ? [{ path: 'condition', message: 'Choose the condition.' }] : []),
    ...(!isNamed && typed.condition === 'clean' ? [{ path: 'condition', message: 'Contents that nobody has named are never clean. Choose the refrigerant, or another condition.' }] : []),
    ...('reason' in amount ? [{ path: 'mills', message: amount.reason }] : []),
    ...('parts' in amount && amount.parts > MOST_MILLS ? [{ path: 'mills', message: 'At most 10,000. Look at the figure again.' }] : []),
    ...(isDay(typed.fromDay) ? [] : [{ path: 'fromDay', message: 'Give the first day.' }]),
    ...untilFaults(typed),
  ]
  if (faults.length > 0 || 'reason' in amount) return { draft: null, faults }
  const mills = typed.pays === 'we' && amount.parts > 0 ? -amount.parts : amount.parts
  return {
    faults: [],
    draft: {
      refrigerant: isNamed ? typed.refrigerant : null, condition: typed.condition, mills, per: typed.per,
      fromDay: typed.fromDay, untilDay: typed.untilDay === '' ? null : typed.untilDay,
    },
  }
}

function untilFaults({ fromDay, untilDay }: PriceTyped): Fault[] {
  if (untilDay === '') return []
  if (!isDay(untilDay)) return [{ path: 'untilDay', message: 'The calendar has no such day.' }]
  return untilDay < fromDay ? [{ path: 'untilDay', message: 'Not before its first day.' }] : []
}
