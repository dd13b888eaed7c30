import { and, desc, eq, isNull, lte } from 'drizzle-orm'
import { firmPrices, firmTerms } from '~~/drizzle/schema'
import type { Day } from '~~/utils/quantity/day'
import type { DatedPrice } from '~~/utils/reclaim/price'
import type { ReclaimerTerms } from '~~/utils/reclaim/terms'
import type { Database } from '../database/database'

/** What a reclaimer takes on a day: the terms that began last and were not withdrawn, of two from one day those recorded last; null where none are recorded. */
export async function termsOn(db: Database, firmId: string, day: Day): Promise<ReclaimerTerms | null> {
  const [row] = await db.read.select({ terms: firmTerms.terms }).from(firmTerms)
    .where(and(eq(firmTerms.firmId, firmId), lte(firmTerms.fromDay, day), isNull(firmTerms.withdrawnAt)))
    .orderBy(desc(firmTerms.fromDay), desc(firmTerms.recordedAt), desc(firmTerms.id)).limit(1)
  return row ? row.terms as ReclaimerTerms : null
}

/** Every price of a reclaimer that was not withdrawn, past ones and ones to come among them. */
export async function pricesOf(db: Database, firmId: string): Promise<DatedPrice[]> {
  const rows = await db.read.select().from(firmPrices).where(and(eq(firmPrices.firmId, firmId), isNull(firmPrices.withdrawnAt)))
  return rows.map(({ id, refrigerant, condition, fromDay, untilDay, mills, per, recordedAt }) =>
    ({ id, refrigerant, condition, fromDay, untilDay, rate: { mills, per }, recordedAt }))
}
