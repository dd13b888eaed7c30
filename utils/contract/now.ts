import { z } from 'zod'
import { units } from './session'

/** GET /api/now?unit=: in the unit of the screen; without one in the person's own. */
export const nowQuery = z.strictObject({ unit: units.optional() })

/** One thing that waits for this person: how many, in words, why it matters, and the act that clears it. */
export interface NowLine {
  /** The same as long as it is the same thing, so that a screen can tell what is new. */
  key: string
  topic: string
  kind: 'stop' | 'att' | 'unk'
  number: number
  sentence: string
  reason: string
  verb: string
  /** The screen that clears it. */
  to: string
}

/** What GET /api/now answers: the most urgent first; `seq` is how far the custody log had come. */
export interface NowAnswer { seq: number, asOf: string, lines: NowLine[] }
