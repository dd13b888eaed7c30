import { eq } from 'drizzle-orm'
import { meta } from '../../../drizzle/schema'
import type { LogVerification } from '../../../utils/contract/log'
import { statement, type Database } from '../database/database'

const KEY = 'log-verified'

/** How the custody log was last checked. */
export interface LastVerification {
  /** UTC milliseconds. */
  at: number
  isOk: boolean
  /** The newest checkpoint that was ever found good together with all before it. */
  goodUpTo: number | null
}

interface Kept { ok: boolean, verifiedAt: string, goodUpTo?: number | null }

/** Keeps when the custody log was checked, whether it added up, and up to which checkpoint. */
export async function keepVerification(db: Database, { ok, verifiedAt, upTo }: LogVerification): Promise<void> {
  const goodUpTo = ok ? upTo : (await lastVerification(db))?.goodUpTo ?? null
  const value = JSON.stringify({ ok, verifiedAt, goodUpTo } satisfies Kept)
  await db.write([statement(db.read.insert(meta).values({ key: KEY, value }).onConflictDoUpdate({ target: meta.key, set: { value } }))])
}

/** How the custody log was last checked; null where it never was. */
export async function lastVerification({ read }: Database): Promise<LastVerification | null> {
  const [row] = await read.select().from(meta).where(eq(meta.key, KEY))
  if (!row) return null
  const { ok, verifiedAt, goodUpTo } = JSON.parse(row.value) as Kept
  return { at: Date.parse(verifiedAt), isOk: ok, goodUpTo: goodUpTo ?? null }
}
