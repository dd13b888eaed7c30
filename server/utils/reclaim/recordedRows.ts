import type { InStatement } from '@libsql/client'
import { desc, eq } from 'drizzle-orm'
import { v7 as uuid } from 'uuid'
import { firmPrices, firmTerms } from '~~/drizzle/schema'
import type { Access } from '~~/utils/access/roles'
import type { NewPrice, NewTerms, PriceRow, PricesAnswer, RecordedRow, TermsAnswer, TermsRow } from '~~/utils/contract/reclaim'
import { dayOfInstant } from '~~/utils/quantity/day'
import { mayBeWithdrawn } from '~~/utils/reclaim/dated'
import type { ReclaimerTerms } from '~~/utils/reclaim/terms'
import { statement, type Database } from '../database/database'
import { directory, namesOf, type Directory } from '../directory/directory'
import { problem } from '../http/problem'
import { theReclaimer } from './theReclaimer'

type Kept = Pick<typeof firmTerms.$inferSelect, 'fromDay' | 'recordedBy' | 'recordedAt' | 'withdrawnBy' | 'withdrawnAt'>

/** All that was ever recorded of what a reclaimer takes, the latest beginning first. Errors: 404; 422 for another sort of firm. */
export async function termsRecorded(db: Database, firmId: string, now: number): Promise<TermsAnswer> {
  await theReclaimer(db, firmId)
  const from = await directory(db)
  const rows = await db.read.select().from(firmTerms).where(eq(firmTerms.firmId, firmId))
    .orderBy(desc(firmTerms.fromDay), desc(firmTerms.recordedAt), desc(firmTerms.id))
  return {
    today: dayOfInstant(now, from.timeZone),
    items: rows.map((row): TermsRow => ({ id: row.id, fromDay: row.fromDay, terms: row.terms as ReclaimerTerms, ...asRecorded(row, from, now) })),
  }
}

/** All that was ever recorded of what a reclaimer pays, by refrigerant and condition, the latest first. Errors: 404; 422 for another sort of firm. */
export async function pricesRecorded(db: Database, firmId: string, now: number): Promise<PricesAnswer> {
  await theReclaimer(db, firmId)
  const from = await directory(db)
  const rows = await db.read.select().from(firmPrices).where(eq(firmPrices.firmId, firmId))
    .orderBy(firmPrices.refrigerant, firmPrices.condition, desc(firmPrices.fromDay), desc(firmPrices.recordedAt), desc(firmPrices.id))
  return {
    today: dayOfInstant(now, from.timeZone),
    items: rows.map((row): PriceRow => ({
      price: {
        id: row.id, refrigerant: row.refrigerant, condition: row.condition, fromDay: row.fromDay, untilDay: row.untilDay,
        rate: { mills: row.mills, per: row.per }, recordedAt: row.recordedAt,
      },
      ...asRecorded(row, from, now),
    })),
  }
}

/**
 * Records what a reclaimer takes from a day on; what stood before stays in the history. The same sent again changes nothing.
 *
 * Errors: 404; 422 for another sort of firm; 409 where other terms have this id.
 */
export async function recordTerms(db: Database, firmId: string, { id = uuid(), fromDay, terms }: NewTerms, by: Access, now: number): Promise<TermsRow> {
  await theReclaimer(db, firmId)
  await db.write([statement(db.read.insert(firmTerms).values({ id, firmId, fromDay, terms, recordedBy: by.personId, recordedAt: now }).onConflictDoNothing())])
  const row = (await termsRecorded(db, firmId, now)).items.find(one => one.id === id)
  if (row?.fromDay !== fromDay || JSON.stringify(row.terms) !== JSON.stringify(terms)) throw otherHasThisId()
  return row
}

/**
 * Records a price from a day on; what stood before stays in the history. The same sent again changes nothing.
 *
 * Errors: 404; 422 for another sort of firm; 409 where another price has this id.
 */
export async function recordPrice(db: Database, firmId: string, { id = uuid(), untilDay = null, ...body }: NewPrice, by: Access, now: number): Promise<PriceRow> {
  await theReclaimer(db, firmId)
  await db.write([statement(db.read.insert(firmPrices).values({ id, firmId, untilDay, ...body, recordedBy: by.personId, recordedAt: now }).onConflictDoNothing())])
  const row = (await pricesRecorded(db, firmId, now)).items.find(({ price }) => price.id === id)
  const { refrigerant, condition, fromDay, mills, per } = body
  const { price } = row ?? {}
  const isTheSame = price?.refrigerant === refrigerant && price.condition === condition && price.fromDay === fromDay && price.untilDay === untilDay
    && price.rate.mills === mills && price.rate.per === per
  if (!row || !isTheSame) throw otherHasThisId()
  return row
}

/** Takes terms back that have not begun, or were recorded today. Errors: 404; 409 once they count. Sent again it changes nothing. */
export async function withdrawTerms(db: Database, firmId: string, id: string, by: Access, now: number): Promise<TermsRow> {
  return withdrawn(db, { table: 'firm_terms', id, by, now }, async () => (await termsRecorded(db, firmId, now)).items.find(row => row.id === id))
}

/** Takes a price back that has not begun, or was recorded today. Errors: 404; 409 once it counts. Sent again it changes nothing. */
export async function withdrawPrice(db: Database, firmId: string, id: string, by: Access, now: number): Promise<PriceRow> {
  return withdrawn(db, { table: 'firm_prices', id, by, now }, async () => (await pricesRecorded(db, firmId, now)).items.find(({ price }) => price.id === id))
}

async function withdrawn<Row extends RecordedRow>(
  db: Database, { table, id, by, now }: { table: 'firm_terms' | 'firm_prices', id: string, by: Access, now: number }, find: () => Promise<Row | undefined>,
): Promise<Row> {
  const row = await find()
  if (!row) throw problem(404, 'Not there', 'Nothing of this firm has this id.')
  if (row.withdrawn) return row
  if (!row.mayWithdraw) throw problem(409, 'It has begun', 'What was reckoned by it keeps it. Record what takes its place from its day on.', undefined, { type: 'row-begun' })
  const take: InStatement = { sql: `UPDATE ${table} SET withdrawn_by = ?, withdrawn_at = ? WHERE id = ? AND withdrawn_at IS NULL`, args: [by.personId, now, id] }
  await db.write([take])
  return (await find())!
}

function asRecorded(row: Kept, from: Directory, now: number): RecordedRow {
  const { person } = namesOf(from)
  const { timeZone } = from
  const recordedOn = dayOfInstant(row.recordedAt, timeZone)
  const withdrawn = row.withdrawnAt === null || row.withdrawnBy === null ? null : { by: person(row.withdrawnBy), on: dayOfInstant(row.withdrawnAt, timeZone) }
  return {
    recordedBy: person(row.recordedBy),
    recordedAt: new Date(row.recordedAt).toISOString(),
    recordedOn,
    withdrawn,
    mayWithdraw: mayBeWithdrawn({ fromDay: row.fromDay, isWithdrawn: withdrawn !== null }, recordedOn, dayOfInstant(now, timeZone)),
  }
}

function otherHasThisId() {
  return problem(409, 'Something else has this id', 'It was recorded before with other contents. Look at what stands, then send yours under a new id.')
}
