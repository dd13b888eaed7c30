import { and, desc, eq, lt, or } from 'drizzle-orm'
import { createTransport } from 'nodemailer'
import { v7 as uuid } from 'uuid'
import { mail } from '../../../drizzle/schema'
import type { MailAnswer, MailLine } from '../../../utils/contract/mail'
import type { MailOutcome } from '../../../utils/contract/people'
import { useDatabase } from '../database/currentDatabase'
import { statement } from '../database/database'
import { useEnvironment } from '../environment'
import { foreignCursor } from '../http/cursor'

const PATIENCE_MS = 10_000
const LONGEST_ERROR = 300

/** A letter as it is written. */
export interface Letter {
  recipient: string
  subject: string
  body: string
  /** A text of the body that goes to the reader alone: the letter is kept without it. */
  unkept?: string
}

const NOT_KEPT = '(told to the reader alone)'

/**
 * Keeps a letter and, where a mail server is set, sends it. A failure is recorded on the letter and told, never thrown:
 * what was to be said is not lost.
 */
export async function sendMail(letter: Letter, now: number): Promise<MailOutcome> {
  const { read, write } = useDatabase()
  const id = uuid()
  const { recipient, subject, body, unkept } = letter
  const keptBody = unkept === undefined ? body : body.replaceAll(unkept, NOT_KEPT)
  await write([statement(read.insert(mail).values({ id, recipient, subject, body: keptBody, createdAt: now }))])
  const { smtpUrl, mailFrom } = useEnvironment()
  if (!smtpUrl) return 'kept'
  const error = await deliver(letter, smtpUrl, mailFrom)
  const outcome = error ? { error } : { sentAt: Date.now() }
  await write([statement(read.update(mail).set(outcome).where(eq(mail.id, id)))])
  return error ? 'failed' : 'sent'
}

/** The letters kept, newest first, a page at a time. Errors: 400 for a cursor that is none of ours. */
export async function listMail({ limit, cursor }: { limit: number, cursor?: string }): Promise<MailAnswer> {
  const [at, id] = cursorOf(cursor) ?? []
  const before = at !== undefined && id !== undefined ? or(lt(mail.createdAt, at), and(eq(mail.createdAt, at), lt(mail.id, id))) : undefined
  const rows = await useDatabase().read.select().from(mail).where(before).orderBy(desc(mail.createdAt), desc(mail.id)).limit(limit + 1)
  const shown = rows.slice(0, limit)
  const last = shown.at(-1)
  return {
    items: shown.map(lineOf),
    nextCursor: rows.length > limit && last ? `${last.createdAt}_${last.id}` : null,
  }
}

function cursorOf(text: string | undefined): [at: number, id: string] | null {
  if (text === undefined) return null
  const [, at, id] = /^(\d{1,15})_([0-9a-f-]{36})$/.exec(text) ?? []
  if (at === undefined || id === undefined) throw foreignCursor()
  return [Number(at), id]
}

/** What the mail server said against it, or null when it took the letter. */
async function deliver({ recipient, subject, body }: Letter, url: string, from: string | undefined): Promise<string | null> {
  const transport = createTransport({ url, connectionTimeout: PATIENCE_MS, greetingTimeout: PATIENCE_MS, socketTimeout: PATIENCE_MS })
  try {
    await transport.sendMail({ from, to: { name: '', address: recipient }, subject, text: body, disableFileAccess: true, disableUrlAccess: true })
    return null
  }
  catch (error) {
    return (error instanceof Error ? error.message : 'unknown').slice(0, LONGEST_ERROR)
  }
  finally {
    transport.close()
  }
}

function lineOf(row: typeof mail.$inferSelect): MailLine {
  return {
    id: row.id,
    recipient: row.recipient,
    subject: row.subject,
    // A letter that reached its reader holds a link that is the reader's alone.
    body: row.sentAt === null ? row.body : null,
    createdAt: new Date(row.createdAt).toISOString(),
    sentAt: row.sentAt === null ? null : new Date(row.sentAt).toISOString(),
    error: row.error,
  }
}
