import type { InStatement } from '@libsql/client'
import { eq } from 'drizzle-orm'
import { v7 as uuid } from 'uuid'
import { mail, mailAttachments } from '../../../drizzle/schema'
import type { MailOutcome } from '../../../utils/contract/people'
import { useDatabase } from '../database/currentDatabase'
import { statement } from '../database/database'
import { useEnvironment } from '../environment'
import { deliver } from './deliver'

/** A paper that goes with a letter. */
export interface Attachment { name: string, mediaType: string, content: Buffer }

/** A letter as it is written. */
export interface Letter {
  recipient: string
  subject: string
  body: string
  /** A text of the body that goes to the reader alone: the letter is kept without it. */
  unkept?: string
  attachments?: readonly Attachment[]
}

/** A letter under an id is sent once, however often it is asked for; `alongside` is written in the commit that keeps it. */
export interface Keeping { id?: string, alongside?: readonly InStatement[] }

/** What stands in a kept letter where its reader alone was told something. */
export const NOT_KEPT = '(told to the reader alone)'

const underWay = new Set<string>()

/**
 * Keeps a letter and, where a mail server is set, sends it. A failure is recorded on the letter and told, never thrown:
 * what was to be said is not lost.
 */
export async function sendMail(letter: Letter, now: number, { id = uuid(), alongside = [] }: Keeping = {}): Promise<MailOutcome> {
  const { read, write } = useDatabase()
  const { recipient, subject, body, unkept, attachments = [] } = letter
  const keptBody = unkept === undefined ? body : body.replaceAll(unkept, NOT_KEPT)
  const [kept] = await write([
    statement(read.insert(mail).values({ id, recipient, subject, body: keptBody, createdAt: now }).onConflictDoNothing().returning({ id: mail.id })),
    ...attachments.map((attachment, position) => statement(read.insert(mailAttachments).values({ mailId: id, position, ...attachment }).onConflictDoNothing())),
    ...alongside,
  ])
  if (kept?.rows.length !== 1) return (await keptAs(id))?.outcome ?? 'kept'
  return handOver(id, letter)
}

/** Hands a kept letter to the mail server, where one is set, and records what became of it. */
export async function handOver(id: string, letter: Letter): Promise<MailOutcome> {
  const { smtpUrl, mailFrom } = useEnvironment()
  if (!smtpUrl) return 'kept'
  underWay.add(id)
  try {
    const error = await deliver(letter, smtpUrl, mailFrom)
    const { read, write } = useDatabase()
    await write([statement(read.update(mail).set(error === null ? { sentAt: Date.now(), error: null } : { error }).where(eq(mail.id, id)))])
    return error === null ? 'sent' : 'failed'
  }
  finally {
    underWay.delete(id)
  }
}

/** Whether the mail server has a letter before it just now, so that it is not handed over twice. */
export function isUnderWay(id: string): boolean {
  return underWay.has(id)
}

/** To whom a letter went and what became of it; null where none is kept under this id. */
export async function keptAs(id: string): Promise<{ recipient: string, outcome: MailOutcome } | null> {
  const [row] = await useDatabase().read.select({ recipient: mail.recipient, sentAt: mail.sentAt, error: mail.error }).from(mail).where(eq(mail.id, id))
  if (!row) return null
  const { recipient, sentAt, error } = row
  if (sentAt !== null) return { recipient, outcome: 'sent' }
  return { recipient, outcome: error === null ? 'kept' : 'failed' }
}
