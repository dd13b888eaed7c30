import { z } from 'zod'
import { NOT_A_GAS, SHIPPER_ENTRIES, shipperEntry } from '../transport/shipperEntries'
import type { ShippingPapers } from '../transport/shippingPapers'
import { id, line, printedLine } from './parts'
import type { MailOutcome } from './people'
import { email } from './session'

const act = { id, occurredAt: z.iso.datetime({ offset: true }) }

const identification = z.enum([...SHIPPER_ENTRIES.map(entry => entry.identification), NOT_A_GAS])

/** PUT /api/shipments/{id}/lines/{cylinderId}/classification: how the shipper says it travels; null takes that back. */
export const classificationBody = z.strictObject({
  ...act,
  classification: z.strictObject({
    identification,
    technicalNames: z.array(printedLine(80)).max(6).default([]),
    /** null confirms what was proposed. */
    reason: printedLine(200).nullable().default(null),
  }).superRefine(({ identification, technicalNames }, context) => {
    if (!shipperEntry(identification)?.asksForNames || technicalNames.length > 0) return
    context.addIssue({ code: 'custom', path: ['technicalNames'], message: 'name what is in it: this entry asks for technical names' })
  }).nullable(),
})
export const classificationParams = z.strictObject({ id, cylinderId: id })

/** POST /api/shipments/{id}/papers/mail: both papers to the reclaimer, or to another address. */
export const papersMailBody = z.strictObject({ ...act, to: email.optional(), note: line(500).optional() })

export type LineClassification = z.output<typeof classificationBody>
export type PapersMail = z.output<typeof papersMailBody>

/** What GET /api/shipments/{id}/papers answers; a draft has not left with them yet. */
export interface PapersAnswer { papers: ShippingPapers, isDraft: boolean }

/** What POST /api/shipments/{id}/papers/mail answers. */
export interface PapersMailAnswer { mail: MailOutcome, recipient: string }
