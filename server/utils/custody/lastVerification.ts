import { eq } from 'drizzle-orm'
import { meta } from '../../../drizzle/schema'
import type { LogVerification } from '../../../utils/contract/log'
import { statement, type Database } from '../database/database'

const KEY = 'log-verified'

/** Keeps when the custody log was checked and whether it added up. */
export async function keepVerification({ read, write }: Database, { ok, verifiedAt }: LogVerification): Promise<void> {
  const value = JSON.stringify({ ok, verifiedAt })
  await write([statement(read.insert(meta).values({ key: KEY, value }).onConflictDoUpdate({ target: meta.key, set: { value } }))])
}

/** When the custody log was last checked (UTC milliseconds) and whether it added up; null where it never was. */
export async function lastVerification({ read }: Database): Promise<{ at: number, isOk: boolean } | null> {
  const [row] = await read.select().from(meta).where(eq(meta.key, KEY))
  if (!row) return null
  const { ok, verifiedAt } = JSON.parse(row.value) as Pick<LogVerification, 'ok' | 'verifiedAt'>
  return { at: Date.parse(verifiedAt), isOk: ok }
}
