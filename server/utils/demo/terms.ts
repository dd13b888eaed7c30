import type { InStatement } from '@libsql/client'
import { firmPrices, firmTerms } from '../../../drizzle/schema'
import { dayOfInstant } from '../../../utils/quantity/day'
import type { Priced, Rate } from '../../../utils/reclaim/price'
import type { ReclaimerTerms } from '../../../utils/reclaim/terms'
import { statement, type Database } from '../database/database'
import { DAY, workingMorning } from './calendar'
import { DEMO_TIME_ZONE, type Cast } from './cast'
import { seededRandom } from './random'

const SEED = 20_261_213

// Every figure here is invented: no reclaimer asks or pays so.

const GOOD = ['clean', 'suspect'] as const
const USED = [...GOOD, 'burnt'] as const
const HALVERN: ReclaimerTerms = {
  refrigerants: [
    ...['R-22', 'R-134a', 'R-410A', 'R-404A', 'R-407C'].map(designation => ({ designation, conditions: [...USED] })),
    ...['R-32', 'R-454B'].map(designation => ({ designation, conditions: [...GOOD] })),
  ],
  takesMixed: true, takesUnknown: false, takesOverdue: true, specs: null, pressuresPsig: null, mostContaminationPercent: null,
  minimum: { unit: 'lb', value: 500 }, minimumCylinders: null, pickUpCents: 8500, note: 'Ring the dock the day before.',
}
const BRINDMOOR: ReclaimerTerms = {
  refrigerants: ['R-22', 'R-134a', 'R-410A'].map(designation => ({ designation, conditions: [...GOOD] })),
  takesMixed: false, takesUnknown: false, takesOverdue: false, specs: ['DOT-4BA', 'DOT-4BW'], pressuresPsig: [350, 400], mostContaminationPercent: 2,
  minimum: null, minimumCylinders: 6, pickUpCents: 0, note: null,
}
const TRESSICK: ReclaimerTerms = {
  refrigerants: ['R-404A', 'R-407C', 'R-410A', 'R-448A', 'R-507A'].map(designation => ({ designation, conditions: [...USED, 'unknown'] })),
  takesMixed: true, takesUnknown: true, takesOverdue: true, specs: null, pressuresPsig: null, mostContaminationPercent: 30,
  minimum: { unit: 'kg', value: 100 }, minimumCylinders: null, pickUpCents: null, note: 'What is beyond reclaiming it has destroyed, at a charge.',
}

type Name = 'reclaimer' | 'otherReclaimer' | 'thirdReclaimer'
/** From how many days before the story's end (before it: to come) until how many. */
interface Told { from: number, until?: number }

const TERMS: (Told & { firm: Name, terms: ReclaimerTerms })[] = [
  { firm: 'reclaimer', from: 540, terms: { ...HALVERN, minimum: { unit: 'lb', value: 300 }, pickUpCents: 6500, refrigerants: HALVERN.refrigerants.slice(0, 5) } },
  { firm: 'reclaimer', from: 120, terms: HALVERN },
  { firm: 'otherReclaimer', from: 400, terms: BRINDMOOR },
  { firm: 'otherReclaimer', from: -45, terms: { ...BRINDMOOR, takesOverdue: true, minimumCylinders: 8 } },
  { firm: 'thirdReclaimer', from: 60, terms: TRESSICK },
]

const PRICES: (Told & Priced & Rate & { firm: Name })[] = [
  { firm: 'reclaimer', refrigerant: 'R-22', condition: 'clean', from: 540, mills: 4500, per: 'lb' },
  { firm: 'reclaimer', refrigerant: 'R-22', condition: 'clean', from: 120, mills: 5250, per: 'lb' },
  { firm: 'reclaimer', refrigerant: 'R-22', condition: 'clean', from: -30, mills: 5750, per: 'lb' },
  { firm: 'reclaimer', refrigerant: 'R-22', condition: 'suspect', from: 540, mills: 2250, per: 'lb' },
  { firm: 'reclaimer', refrigerant: 'R-22', condition: 'burnt', from: 540, mills: 750, per: 'lb' },
  { firm: 'reclaimer', refrigerant: 'R-134a', condition: 'clean', from: 540, mills: 1250, per: 'lb' },
  { firm: 'reclaimer', refrigerant: 'R-410A', condition: 'clean', from: 540, mills: 1875, per: 'lb' },
  { firm: 'reclaimer', refrigerant: 'R-410A', condition: 'suspect', from: 540, mills: 600, per: 'lb' },
  { firm: 'reclaimer', refrigerant: 'R-404A', condition: 'clean', from: 540, mills: 1500, per: 'lb' },
  // Ended and never asked for again: from then on there is none.
  { firm: 'reclaimer', refrigerant: 'R-407C', condition: 'clean', from: 540, until: 20, mills: 1100, per: 'lb' },
  { firm: 'reclaimer', refrigerant: null, condition: 'mixed', from: 540, mills: -2500, per: 'lb' },
  { firm: 'otherReclaimer', refrigerant: 'R-22', condition: 'clean', from: 400, mills: 5000, per: 'lb' },
  { firm: 'otherReclaimer', refrigerant: 'R-22', condition: 'clean', from: 40, until: -50, mills: 5400, per: 'lb' },
  { firm: 'otherReclaimer', refrigerant: 'R-134a', condition: 'clean', from: 400, mills: 1400, per: 'lb' },
  { firm: 'otherReclaimer', refrigerant: 'R-410A', condition: 'clean', from: 400, mills: 2000, per: 'lb' },
  { firm: 'thirdReclaimer', refrigerant: 'R-404A', condition: 'clean', from: 60, mills: 3600, per: 'kg' },
  { firm: 'thirdReclaimer', refrigerant: 'R-410A', condition: 'clean', from: 60, mills: 4100, per: 'kg' },
  { firm: 'thirdReclaimer', refrigerant: null, condition: 'mixed', from: 60, mills: -4200, per: 'kg' },
  { firm: 'thirdReclaimer', refrigerant: null, condition: 'unknown', from: 60, mills: -5000, per: 'kg' },
]

/** What each of the demo's reclaimers takes and pays, with what was before and what is to come. */
export function termsTables({ read }: Database, { firms, people: { manager } }: Cast, now: number): InStatement[] {
  // Of their own, so that the story stays as it is whatever they take.
  const { uuid } = seededRandom(SEED)
  const day = (daysAgo: number) => dayOfInstant(now - daysAgo * DAY, DEMO_TIME_ZONE)
  // Nothing was recorded before its day; what is to come was told a week ago.
  const recorded = ({ from }: Told) => ({ recordedBy: manager.id, recordedAt: workingMorning(now - Math.max(from, 7) * DAY) })
  return [
    ...TERMS.map(({ firm, terms, ...told }) => statement(read.insert(firmTerms).values({
      id: uuid(now), firmId: firms[firm].id, fromDay: day(told.from), terms, ...recorded(told),
    }))),
    ...PRICES.map(({ firm, refrigerant, condition, mills, per, ...told }) => statement(read.insert(firmPrices).values({
      id: uuid(now), firmId: firms[firm].id, refrigerant, condition, mills, per, fromDay: day(told.from), untilDay: told.until === undefined ? null : day(told.until), ...recorded(told),
    }))),
  ]
}
