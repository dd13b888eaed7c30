import { z } from 'zod'
import { printedLine } from './parts'
import { units, type Units } from './session'
import { timeZone } from './setUp'

/** GET /api/firm, signed in: the contractor itself. */
export interface OwnFirm {
  name: string
  telephone: string
  timeZone: string
  units: Units
  /** As papers name the shipper. */
  address: string | null
  /** Who answers in an emergency while a load is on its way; a service's registrant or contract where one answers. Source: 49 CFR 172.604. */
  emergencyTelephone: string | null
  emergencyContract: string | null
}

/** PATCH /api/firm: answers OwnFirm. */
export const ownFirmChange = z.strictObject({
  name: printedLine(120).optional(),
  telephone: printedLine(40).optional(),
  timeZone: timeZone.optional(),
  units: units.optional(),
  address: printedLine(300).nullish(),
  emergencyTelephone: printedLine(40).nullish(),
  emergencyContract: printedLine(120).nullish(),
})
export type OwnFirmChange = z.output<typeof ownFirmChange>

/** GET /api/firm/card, open to all: what a finder of a labelled cylinder is told. 404 before set-up. */
export interface FirmCard { name: string, telephone: string }

/** GET /api/health, open to all. */
export interface Health { ok: boolean, version: string, database: 'ok' | 'unreachable' }
