import { z } from 'zod'
import type { LogLine } from '../custody/cylinderView'
import { page, type Page } from './parts'

/** The query of GET /api/countersigning: of all cylinders, or of one by its code, serial or id. */
export const countersigningQuery = z.strictObject({ ...page, cylinder: z.string().min(1).max(80).optional() })

/** What a trainee recorded under a supervisor, as the custody log has it. */
export interface WaitingEntry {
  cylinder: { id: string, labelCode: string | null, serial: string | null }
  line: LogLine
}

/** What GET /api/countersigning answers: what waits for this person's signature, the first recorded first. */
export type CountersigningAnswer = Page<WaitingEntry> & { total: number }
