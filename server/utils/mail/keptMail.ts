import { and, asc, desc, eq, inArray, lt, or, sql } from 'drizzle-orm'
import { mail, mailAttachments } from '../../../drizzle/schema'
import type { MailAnswer, MailAttachment, MailLine } from '../../../utils/contract/mail'
import type { MailOutcome } from '../../../utils/contract/people'
import { useDatabase } from '../database/currentDatabase'
import { useEnvironment } from '../environment'
import { foreignCursor } from '../http/cursor'
import { problem } from '../http/problem'
import { handOver, isUnderWay, NOT_KEPT, type Attachment } from './mail'

/** The letters kept, newest first, a page at a time. Errors: 400 for a cursor that is none of ours. */
export async function listMail({ limit, cursor }: { limit: number, cursor?: string }): Promise<MailAnswer> {
  const { read } = useDatabase()
  const [at, id] = cursorOf(cursor) ?? []
  const before = at !== undefined && id !== undefined ? or(lt(mail.createdAt, at), and(eq(mail.createdAt, at), lt(mail.id, id))) : undefined
  const rows = await read.select().from(mail).where(before).orderBy(desc(mail.createdAt), desc(mail.id)).limit(limit + 1)
  const shown = rows.slice(0, limit)
  const attached = await read.select({
    mailId: mailAttachments.mailId, position: mailAttachments.position, name: mailAttachments.name, bytes: sql<number>`length(${mailAttachments.content})`,
  }).from(mailAttachments).where(inArray(mailAttachments.mailId, shown.map(row => row.id))).orderBy(asc(mailAttachments.position))
  const last = shown.at(-1)
  return {
    items: shown.map(row => lineOf(row, attached.filter(({ mailId }) => mailId === row.id).map(({ mailId: _, ...one }) => one))),
    nextCursor: rows.length > limit && last ? `${last.createdAt}_${last.id}` : null,
    hasServer: useEnvironment().smtpUrl !== undefined,
  }
}

/** A paper that went or is to go with a letter. Errors: 404. */
export async function keptAttachment(mailId: string, position: number): Promise<Attachment> {
  const [row] = await useDatabase().read.select().from(mailAttachments).where(and(eq(mailAttachments.mailId, mailId), eq(mailAttachments.position, position)))
  if (!row) throw problem(404, 'No such paper', 'No letter has it.')
  return { name: row.name, mediaType: row.mediaType, content: Buffer.from(row.content) }
}

/**
 * Sends a letter that was kept inside or that could not be sent.
 *
 * Errors: 404; 409 where it went out already, where it is on its way, where no mail server is set, and for a letter that
 * was kept without what its reader alone was told.
 */
export async function sendKeptMail(id: string): Promise<MailOutcome> {
  const { read } = useDatabase()
  const [row] = await read.select().from(mail).where(eq(mail.id, id))
  if (!row) throw problem(404, 'No such letter', 'It may have been written wrongly.')
  if (row.sentAt !== null) throw problem(409, 'It was sent', 'This letter has gone out already.')
  if (!isWhole(row)) throw problem(409, 'It was kept without its link', 'The link was for its reader alone and is not kept. Make a new one.')
  if (!useEnvironment().smtpUrl) throw problem(409, 'No mail server is set', 'Set SMTP_URL and MAIL_FROM, then send it.')
  const attachments = await read.select().from(mailAttachments).where(eq(mailAttachments.mailId, id)).orderBy(asc(mailAttachments.position))
  if (isUnderWay(id)) throw problem(409, 'It is on its way', 'The mail server has it before it.')
  return handOver(id, { ...row, attachments: attachments.map(({ name, mediaType, content }) => ({ name, mediaType, content: Buffer.from(content) })) })
}

function cursorOf(text: string | undefined): [at: number, id: string] | null {
  if (text === undefined) return null
  const [, at, id] = /^(\d{1,15})_([0-9a-f-]{36})$/.exec(text) ?? []
  if (at === undefined || id === undefined) throw foreignCursor()
  return [Number(at), id]
}

function isWhole({ body }: { body: string }): boolean {
  return !body.includes(NOT_KEPT)
}

function lineOf(row: typeof mail.$inferSelect, attachments: MailAttachment[]): MailLine {
  return {
    id: row.id,
    recipient: row.recipient,
    subject: row.subject,
    // A letter that reached its reader holds a link that is the reader's alone.
    body: row.sentAt === null ? row.body : null,
    createdAt: new Date(row.createdAt).toISOString(),
    sentAt: row.sentAt === null ? null : new Date(row.sentAt).toISOString(),
    error: row.error,
    attachments,
    isWhole: isWhole(row),
  }
}
