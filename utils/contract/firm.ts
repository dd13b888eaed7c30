import { z } from 'zod'
import { printedLine } from './parts'
import { units, type Units } from './session'
import { timeZone } from './setUp'

/** GET /api/firm, signed in: the contractor itself. */
export interface OwnFirm { name: string, telephone: string, timeZone: string, units: Units }

/** PATCH /api/firm: answers OwnFirm. */
export const ownFirmChange = z.strictObject({
  name: printedLine(120).optional(),
  telephone: printedLine(40).optional(),
  timeZone: timeZone.optional(),
  units: units.optional(),
})

/** GET /api/firm/card, open to all: what a finder of a labelled cylinder is told. 404 before set-up. */
export interface FirmCard { name: string, telephone: string }

/** GET /api/health, open to all. */
export interface Health { ok: boolean, version: string, database: 'ok' | 'unreachable' }
