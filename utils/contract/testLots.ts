import { z } from 'zod'
import type { CylinderRow } from '../custody/cylinderView'
import type { Finding } from '../custody/finding'
import { id, line, massReading } from './parts'

const cylinderIds = z.array(id).max(200)

/** POST /api/test-lots: a draft. */
export const testLotBody = z.strictObject({ id: id.optional(), requalifierId: id, cylinderIds: cylinderIds.default([]), note: line(500).nullish() })
/** PUT /api/test-lots/{id}/lines. */
export const testLotLinesBody = z.strictObject({ cylinderIds })

/** POST /api/test-lots/{id}/dispatch. */
export const testLotDispatchBody = z.strictObject({
  occurredAt: z.iso.datetime({ offset: true }),
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  lines: z.array(z.strictObject({ cylinderId: id, eventId: id, expects: z.number().int().nonnegative() })).min(1).max(200),
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
    suffix: z.string().trim().max(3).optional(),
    newTare: massReading.optional(),
    gross: massReading.optional(),
  })).min(1).max(200),
})

export type TestLotState = 'draft' | 'sent' | 'back' | 'cancelled'

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

export interface TestLotWithLines extends TestLot {
  lines: { cylinder: CylinderRow, version: number, because: Finding[], result: { result: string, month: string } | null }[]
}
