import { z } from 'zod'
import { page, type Page } from './parts'

/** GET /api/mail: what was written, newest first. */
export const mailQuery = z.strictObject(page)

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
}

/** What GET /api/mail answers. */
export type MailAnswer = Page<MailLine>
