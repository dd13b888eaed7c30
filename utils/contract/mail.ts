import { z } from 'zod'
import { id, page, type Page } from './parts'
import type { MailOutcome } from './people'

/** GET /api/mail: what was written, newest first. */
export const mailQuery = z.strictObject(page)

/** GET /api/mail/{id}/attachments/{position}. */
export const attachmentParams = z.strictObject({ id, position: z.coerce.number('must be a number').int().min(0).max(99) })

/** A paper that goes with a letter; its place among them is the last part of its path. */
export interface MailAttachment { position: number, name: string, bytes: number }

/** A letter that was kept, and whether it was sent. */
export interface MailLine {
  id: string
  recipient: string
  subject: string
  /** null once it went out: its links belong to the recipient. */
  body: string | null
  createdAt: string
  sentAt: string | null
  /** Why it could not be sent. */
  error: string | null
  attachments: MailAttachment[]
  /** It may be sent as it is kept: nothing was left out that is for its reader alone. */
  isWhole: boolean
}

/** What GET /api/mail answers; `hasServer`: whether a mail server is set. */
export type MailAnswer = Page<MailLine> & { hasServer: boolean }

/** What POST /api/mail/{id}/send answers. */
export interface MailSentAnswer { mail: MailOutcome }
