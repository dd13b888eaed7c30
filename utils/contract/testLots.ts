import { z } from 'zod'
import type { CylinderRow } from '../custody/cylinderView'
import type { Finding } from '../custody/finding'
import { RIN } from '../requalification/struckMark'
import { eachOnce, id, line, massReading, page, type Page } from './parts'

const cylinderIds = z.array(id).max(200).refine(ids => eachOnce(ids), 'must name each cylinder once')

/** POST /api/test-lots: a draft. */
export const testLotBody = z.strictObject({ id: id.optional(), requalifierId: id, cylinderIds: cylinderIds.default([]), note: line(500).nullish() })
/** PUT /api/test-lots/{id}/lines. */
export const testLotLinesBody = z.strictObject({ cylinderIds })

/** POST /api/test-lots/{id}/dispatch. */
export const testLotDispatchBody = z.strictObject({
  occurredAt: z.iso.datetime({ offset: true }),
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  lines: z.array(z.strictObject({ cylinderId: id, eventId: id, expects: z.number().int().nonnegative() })).min(1).max(200)
    .refine(lines => eachOnce(lines.map(one => one.cylinderId)), 'must name each cylinder once'),
})

/** POST /api/test-lots/{id}/return: what the test station found, and the cylinders back at a place of ours. */
export const testLotReturnBody = z.strictObject({
  occurredAt: z.iso.datetime({ offset: true }),
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  toPlaceId: id,
  lines: z.array(z.strictObject({
    cylinderId: id,
    retestedEventId: id,
    returnedEventId: id,
    result: z.enum(['passed', 'rejected', 'condemned']),
    method: z.enum(['volumetric', 'proof', 'visual']),
    month: z.string().regex(/^\d{4}-(0[1-9]|1[0-2])$/),
    rin: z.string().trim().toUpperCase().regex(RIN, 'must be a RIN: four letters or figures').optional(),
    suffix: z.string().trim().max(3).optional(),
    newTare: massReading.optional(),
    gross: massReading.optional(),
  })).min(1).max(200).refine(lines => eachOnce(lines.map(one => one.cylinderId)), 'must name each cylinder once'),
})

const TEST_LOT_STATES = ['draft', 'sent', 'back', 'cancelled'] as const
export type TestLotState = (typeof TEST_LOT_STATES)[number]

/** GET /api/test-lots: the newest first. */
export const testLotsQuery = z.strictObject({ ...page, state: z.enum(TEST_LOT_STATES).optional() })

export type NewTestLot = z.output<typeof testLotBody>
export type TestLotDispatch = z.output<typeof testLotDispatchBody>
export type TestLotReturn = z.output<typeof testLotReturnBody>
export type TestLotsQuery = z.output<typeof testLotsQuery>
export type TestLotsAnswer = Page<TestLot>

export interface TestLot {
  id: string
  number: number
  requalifier: { id: string, name: string, rin: string | null }
  state: TestLotState
  note: string | null
  createdAt: string
  sentAt: string | null
  backAt: string | null
  cylinders: number
}

export interface TestLotLine {
  cylinder: CylinderRow
  version: number
  /** Why it may not go to the test; empty when it may. */
  because: Finding[]
  /** Still on the lot: not given back yet. */
  open: boolean
  /** Of the `retested` event that this lot brought. */
  result: { result: string, month: string } | null
}

export interface TestLotWithLines extends TestLot { lines: TestLotLine[] }
