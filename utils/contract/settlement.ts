import { z } from 'zod'
import type { CylinderRow } from '../custody/cylinderView'
import { prose } from '../custody/schema/parts'
import type { DockLine, UnexpectedCylinder } from '../dock/dockLines'
import type { SettlementCredit } from '../settlement/credit'
import { DISPUTE_OUTCOMES, DISPUTE_SUBJECTS, type DisputeOutcome, type DisputeSubject } from '../settlement/dispute'
import { LINE_OUTCOMES, type LineFigures, type SentFigures, type StatementFigures } from '../settlement/figures'
import { LARGEST_STATEMENT } from '../settlement/fileKinds'
import type { FourWeights } from '../settlement/fourWeights'
import type { StillMissing } from '../settlement/missing'
import type { LineMixingCost, MixingCost } from '../settlement/mixingCost'
import { STATEMENT_COLUMNS } from '../settlement/statementColumns'
import type { StatementPreview } from '../settlement/statementCsv'
import { eachOnce, id, line, massReading } from './parts'
import type { Shipment } from './shipments'
import type { ShipmentFile } from './shipmentFiles'

/** Under its id each act is kept once, however often it is sent. */
const act = { id, occurredAt: z.iso.datetime({ offset: true }) }
/** The settlement as its sender saw it: where somebody changed it since, nothing is written. */
const revision = z.number().int().nonnegative()
const cents = z.number().int().min(-100_000_000_00).max(100_000_000_00)
const mills = z.number().int().min(-1_000_000_000).max(1_000_000_000)
const photoIds = z.array(id).max(6).refine(ids => eachOnce(ids), 'must name each photo once').default([])

/** PUT /api/shipments/{id}/settlement/lines: the reclaimer's figures of some lines, as they were typed. */
export const settlementLinesBody = z.strictObject({
  ...act,
  revision,
  lines: z.array(z.strictObject({
    cylinderId: id,
    theirGross: massReading.nullable(),
    acceptedNet: massReading.nullable(),
    grade: line(80).nullable(),
    rate: z.strictObject({ mills, per: z.enum(['lb', 'kg']) }).nullable(),
    statedCents: cents.nullable(),
    outcome: z.enum(LINE_OUTCOMES).nullable(),
  })).min(1).max(200).refine(lines => eachOnce(lines.map(one => one.cylinderId)), 'must name each cylinder once'),
})
export type SettlementLines = z.output<typeof settlementLinesBody>

/** PUT /api/shipments/{id}/settlement/statement: what the statement says of the whole shipment. */
export const settlementStatementBody = z.strictObject({
  ...act,
  revision,
  number: line(60).nullable(),
  day: z.iso.date('must be a day such as "2026-03-02"').nullable(),
  others: z.array(z.strictObject({ what: line(80), cents })).max(20),
  totalCents: cents.nullable(),
})
export type SettlementStatement = z.output<typeof settlementStatementBody>

/** POST /api/shipments/{id}/settlement/settle: an event for each line taken over, and, where it is named, for one that did not arrive. */
export const settleBody = z.strictObject({
  ...act,
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  revision,
  lines: z.array(z.strictObject({ cylinderId: id, eventId: id, expects: z.number().int().nonnegative() })).max(200)
    .refine(lines => eachOnce(lines.map(one => one.cylinderId)), 'must name each cylinder once'),
})
export type Settling = z.output<typeof settleBody>

/** POST /api/shipments/{id}/settlement/close. */
export const closeBody = z.strictObject(act)
export type Closing = z.output<typeof closeBody>

const statementFile = z.custom<Uint8Array>(value => value instanceof Uint8Array && value.length > 0 && value.length <= LARGEST_STATEMENT, `must be a file of at most ${LARGEST_STATEMENT / 1024} KiB`)
  .meta({ type: 'string', contentEncoding: 'binary' })
const columnChoice = z.string().max(2_000).transform((text, context) => {
  const chosen = z.partialRecord(z.enum(STATEMENT_COLUMNS), z.string().min(1).max(200)).safeParse(parsedJson(text))
  if (chosen.success) return chosen.data
  context.addIssue({ code: 'custom', message: 'must be JSON: our names of columns, each with the name in the file' })
  return z.NEVER
}).meta({ type: 'string' })

/** POST /api/shipments/{id}/settlement/csv-preview: a statement's table of values and how to read it; nothing is taken over. */
export const csvPreviewForm = z.strictObject({
  file: statementFile,
  encoding: z.enum(['utf-8', 'windows-1252']).default('utf-8'),
  delimiter: z.enum(['comma', 'semicolon', 'tab']).optional(),
  decimal: z.enum(['point', 'comma']).default('point'),
  unit: z.enum(['lb', 'kg']).optional(),
  columns: columnChoice.optional(),
})
export type CsvReading = z.output<typeof csvPreviewForm>

/** POST /api/shipments/{id}/settlement/csv-take-over: the same file read the same way, and the preview that was looked at. */
export const csvTakeOverForm = csvPreviewForm.extend({
  id,
  occurredAt: z.iso.datetime({ offset: true }),
  previewHash: z.string().regex(/^[0-9a-f]{64}$/, 'must be the hash of a preview'),
})
export type CsvTakeOver = z.output<typeof csvTakeOverForm>

/** The query of GET /api/shipments/{id}/settlement/csv: `empty` gives the table that a reclaimer fills in. */
export const settlementCsvQuery = z.strictObject({ unit: z.enum(['lb', 'kg']).default('lb'), empty: z.enum(['yes', 'no']).default('no') })
export type SettlementCsvQuery = z.output<typeof settlementCsvQuery>

/** What a statement would change; `hash` stands for all that is shown. */
export interface CsvPreviewAnswer extends StatementPreview { hash: string, delimiter: 'comma' | 'semicolon' | 'tab' }

/** POST /api/shipments/{id}/disputes: a person opens one. */
export const disputeBody = z.strictObject({ ...act, disputeId: id, about: z.enum(DISPUTE_SUBJECTS), cylinderId: id.nullable(), text: prose(1_000), photoIds })
export type NewDispute = z.output<typeof disputeBody>

/** The path of one dispute of a shipment. */
export const disputeParams = z.strictObject({ id, dispute: id })

/** POST /api/shipments/{id}/disputes/{dispute}/messages. */
export const disputeMessageBody = z.strictObject({ ...act, text: prose(1_000), photoIds })
export type DisputeMessage = z.output<typeof disputeMessageBody>

/** POST /api/shipments/{id}/disputes/{dispute}/end. */
export const disputeEndBody = z.strictObject({ ...act, outcome: z.enum(DISPUTE_OUTCOMES), reason: prose(500) })
export type DisputeEnd = z.output<typeof disputeEndBody>

/** POST /api/shipments/{id}/disputes/{dispute}/reopen. */
export const disputeReopenBody = z.strictObject({ ...act, reason: line(500) })
export type DisputeReopening = z.output<typeof disputeReopenBody>

/** One thing that happened in a dispute. */
export interface DisputeEntry {
  id: string
  kind: 'opened' | 'message' | 'ended' | 'reopened'
  text: string | null
  outcome: DisputeOutcome | null
  photoIds: string[]
  /** null where the figures did it. */
  by: string | null
  at: string
}

/** A difference that is argued with the reclaimer. */
export interface Dispute {
  id: string
  about: DisputeSubject
  cylinderId: string | null
  isByFigures: boolean
  isOpen: boolean
  outcome: DisputeOutcome | null
  history: DisputeEntry[]
}

/** A line of a settlement: the four weights, what the reclaimer says of it, and what the dock said. */
export interface SettlementLine {
  cylinder: CylinderRow
  version: number
  sent: SentFigures | null
  figures: LineFigures
  /** Whether a person has entered them; else they are what the dock said and the day's price. */
  isEntered: boolean
  weights: FourWeights
  dock: DockLine | null
  /** Photos of the cylinder since the shipment was made, ours and the dock's. */
  photoIds: string[]
  /** When it came back; null where it did not. */
  returnedAt: string | null
}

/** The query of GET /api/reclaim/mixing-cost. */
export const mixingCostQuery = z.strictObject({ year: z.coerce.number().int().min(2000).max(2199) })

/** GET /api/reclaim/mixing-cost: the mixed contents that were settled in a year. */
export interface MixingCostAnswer extends Omit<MixingCost, 'lines'> {
  year: number
  lines: (LineMixingCost & { shipmentNumber: number, serial: string | null })[]
}

/** GET /api/shipments/{id}/settlement. */
export interface SettlementAnswer {
  shipment: Shipment
  revision: number
  lines: SettlementLine[]
  statement: StatementFigures
  credit: SettlementCredit
  missing: StillMissing
  unexpected: UnexpectedCylinder[]
  disputes: Dispute[]
  files: ShipmentFile[]
}

function parsedJson(text: string): unknown {
  try {
    return JSON.parse(text)
  }
  catch {
    return null
  }
}
