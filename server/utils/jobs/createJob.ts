import { eq, max } from 'drizzle-orm'
import { v7 as uuid } from 'uuid'
import { jobs } from '~~/drizzle/schema'
import type { NewJob } from '~~/utils/contract/jobs'
import { statement, type Database } from '../database/database'
import { directory } from '../directory/directory'
import { nameKey } from '../directory/takenName'
import { createFirm } from '../firms/createFirm'
import { problem } from '../http/problem'
import { listedRefrigerant } from './listedRefrigerant'

/**
 * A new job; answers its id. The same job sent again is the same one.
 *
 * Where the refrigerant stays the customer's it must stand in somebody's name: the customer of that name is taken, or made.
 *
 * Errors: 409 where another job has this id, and for a name that a firm of another sort has; 422 for a firm that is no
 * customer in use and for a refrigerant that the catalogue does not have.
 */
export async function createJob(db: Database, body: NewJob, createdBy: string, now: number): Promise<string> {
  const id = body.id ?? uuid()
  const refrigerant = listedRefrigerant(body.refrigerant ?? null)
  const asSaid = {
    site: body.site, equipment: body.equipment, keeps: body.keeps, refrigerant, email: body.email ?? null,
    charge: body.charge ?? null, opened: body.opened ?? null, note: body.note ?? null,
  }
  if (await isThere(db, id, asSaid)) return id
  const customer = await customerOf(db, body, now)
  await db.exclusive(async (commit) => {
    if (await isThere(db, id, asSaid)) return
    const [last] = await db.read.select({ number: max(jobs.number) }).from(jobs)
    await commit([statement(db.read.insert(jobs).values({
      id, number: (last?.number ?? 0) + 1, customerId: customer.id, customerName: customer.name, ...asSaid, createdBy, createdAt: now,
    }))])
  })
  return id
}

type AsSaid = Pick<typeof jobs.$inferSelect, 'site' | 'equipment' | 'keeps' | 'refrigerant' | 'email' | 'charge' | 'opened' | 'note'>

/** Errors: 409 where a job of another content has this id. */
async function isThere(db: Database, id: string, said: AsSaid): Promise<boolean> {
  const [row] = await db.read.select().from(jobs).where(eq(jobs.id, id)).limit(1)
  if (!row) return false
  const isSame = (Object.keys(said) as (keyof AsSaid)[]).every(key => JSON.stringify(row[key]) === JSON.stringify(said[key]))
  // What was changed since is not what was sent; it is still the same job.
  if (isSame || row.changes > 0) return true
  throw problem(409, 'Another job has this id', 'Send it again under a new id.')
}

async function customerOf(db: Database, { customerId, customerName, keeps }: NewJob, now: number): Promise<{ id: string | null, name: string }> {
  if (customerId) {
    const firm = (await directory(db)).firms.get(customerId) ?? (await directory(db, true)).firms.get(customerId)
    if (firm?.kind === 'customer' && firm.active) return firm
    throw problem(422, 'Not a customer of ours', 'Choose the customer from the list, or write the name.', [{ path: 'customerId', message: 'must be a customer in use' }])
  }
  const name = customerName!
  const known = await customerNamed(db, name)
  if (known) return known
  if (keeps === 'firm') return { id: null, name }
  try {
    const { id } = await createFirm(db, { name, kind: 'customer' }, now)
    return { id, name }
  }
  catch (error) {
    // Somebody else may have made the same customer in this moment.
    const made = await customerNamed(db, name)
    if (made) return made
    throw error
  }
}

async function customerNamed(db: Database, name: string): Promise<{ id: string, name: string } | undefined> {
  return [...(await directory(db, true)).firms.values()].find(firm => firm.kind === 'customer' && firm.active && nameKey(firm.name) === nameKey(name))
}
