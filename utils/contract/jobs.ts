import { z } from 'zod'
import type { Condition, Named } from '../custody/cylinderView'
import type { DetailsOf } from '../custody/schema'
import type { MassReading } from '../quantity/mass'
import { APPLIANCES, CIRCUMSTANCES, MACHINE_MADE, type LevelVerdict, type RequiredLevel } from '../recovery/types'
import type { MailOutcome } from './people'
import { id, massReading, page, printedLine, type Page } from './parts'

const opened = z.strictObject({
  appliance: z.enum(APPLIANCES).optional(),
  circumstances: z.enum(CIRCUMSTANCES).optional(),
  machineMade: z.enum(MACHINE_MADE).optional(),
})

const said = {
  email: z.email('must be an e-mail address').max(200).nullish(),
  /** Where the equipment stands. */
  site: printedLine(200),
  equipment: printedLine(200),
  /** As the catalogue has it; null where nobody knows it. */
  refrigerant: printedLine(40).nullish(),
  /** The full charge of the equipment. */
  charge: massReading.nullish(),
  opened: opened.nullish(),
  note: printedLine(500).nullish(),
}

/**
 * POST /api/jobs. Refrigerant that stays the customer's needs a customer among the firms: where only a name is given, the
 * one of that name is taken, or made. 422 for a firm that is no customer and for a refrigerant that the catalogue does not have.
 */
export const jobBody = z.strictObject({
  id: id.optional(),
  customerId: id.nullish(),
  customerName: printedLine(120).nullish(),
  keeps: z.enum(['customer', 'firm'], 'must be customer or firm'),
  ...said,
}).refine(({ customerId, customerName }) => customerId || customerName, { message: 'must be named', path: ['customerName'] })

/** PATCH /api/jobs/{id}: what was said wrongly. Whose the refrigerant is stands in the log; a correction of the fill mends it. */
export const jobChange = z.strictObject(said).partial().refine(change => Object.keys(change).length > 0, 'must change something')

/** GET /api/jobs: the newest first. `mine`: made by whoever asks, or with a fill of theirs. */
export const jobsQuery = z.strictObject({ ...page, customer: id.optional(), refrigerant: z.string().min(1).max(40).optional(), mine: z.literal('true').optional() })

/** POST /api/jobs/{id}/recovery-note/mail. The id is the sender's own: the same sent again goes once. */
export const recoveryNoteMailBody = z.strictObject({ id, recipient: z.email('must be an e-mail address').max(200).optional() })

export type NewJob = z.output<typeof jobBody>
export type JobChange = z.output<typeof jobChange>
export type JobsQuery = z.output<typeof jobsQuery>
export type JobsAnswer = Page<JobLine>

/** A visit to a customer's equipment. */
export interface Job {
  id: string
  number: number
  /** id null where only a name is known. */
  customer: { id: string | null, name: string }
  email: string | null
  site: string
  equipment: string
  refrigerant: string | null
  charge: MassReading | null
  /** Whose the recovered refrigerant stays. */
  keeps: 'customer' | 'firm'
  opened: z.output<typeof opened> | null
  note: string | null
  createdAt: string
  createdBy: Named
}

/** A job as a list and a form have it, with what the log says came out. */
export interface JobLine extends Job {
  /** null in a phone's copy, which does not know what came out. */
  cylinders: number | null
  /** Of the fills whose amount is known, those that do not count left out; null where none is known. */
  recoveredGrams: number | null
  /** Fills of which nobody knows how much went in. */
  notKnown: number
}

/** A cylinder as people know it. */
export interface NamedCylinder { id: string, labelCode: string | null, serial: string | null }

/** Who did it: the name, and what is on record of the certification; null where nothing is. */
export interface Doer { id: string, name: string, certification: string | null }

/** What was recovered into one cylinder. Instants are ISO 8601. */
export interface JobFill {
  eventId: string
  cylinder: NamedCylinder
  at: string
  refrigerant: string | null
  condition: Condition | null
  grossBefore: MassReading | null
  grossAfter: MassReading
  /** By weighing; null where the weights do not tell. */
  netGrams: number | null
  /** Of that, from both readings; null where one of them is not on the event. */
  uncertaintyGrams: number | null
  method: string | null
  /** null where nothing was read of the system. */
  reached: LevelVerdict | null
  by: Doer
  supervisor: Doer | null
  /** Whose the refrigerant is; null = the contractor's. */
  ownerId: string | null
  /** Why it does not count in the firm's totals; null where it does. */
  apart: 'practice' | 'unsigned' | null
  /** A correction gave it other details. */
  corrected: boolean
}

/** Refrigerant drawn for a job. */
export interface JobDraw { eventId: string, cylinder: NamedCylinder, at: string, purpose: DetailsOf<'drawn'>['purpose'], netGrams: number | null, apart: JobFill['apart'], by: Doer }

/** A correction that changed what a job's note says. */
export interface JobCorrection { eventId: string, at: string, reason: string }

/** What wants doing about a job, with its source. */
export interface JobCaution { code: 'vacuum-level' | 'disposal-record' | 'system-dependent-limit' | 'weigh-again' | 'not-certified' | 'two-refrigerants', text: string, source: string }

/** A note that went to the customer. */
export interface SentNote { issue: number, recipient: string, sentAt: string, sentBy: string, outcome: MailOutcome }

/** GET /api/jobs/{id}. */
export interface JobAnswer extends JobLine {
  fills: JobFill[]
  /** What went back into equipment. */
  draws: JobDraw[]
  required: Pick<RequiredLevel, 'level' | 'alternative' | 'assumed' | 'source'>
  cautions: JobCaution[]
  /** Of the note as it now stands: 1, and one more for each correction since. */
  issue: number
  corrections: JobCorrection[]
  notes: SentNote[]
}

/** What POST /api/jobs/{id}/recovery-note/mail answers. */
export interface RecoveryNoteMailAnswer { outcome: MailOutcome, recipient: string, issue: number }
