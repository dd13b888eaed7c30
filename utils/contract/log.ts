import { z } from 'zod'
import { page, type Page } from './parts'

/** What is verified: everything, what has come since the last verified checkpoint, or what is made from the log. */
const VERIFY_SCOPES = ['all', 'since', 'caches'] as const
export type VerifyScope = (typeof VERIFY_SCOPES)[number]

/** GET /api/log/verify. */
export const verifyQuery = z.strictObject({ scope: z.enum(VERIFY_SCOPES).default('all') })

/** GET /api/log/checkpoints: newest first. */
export const checkpointsQuery = z.strictObject(page)

/** The path of a checkpoint. */
export const checkpointParams = z.strictObject({ number: z.coerce.number().int().min(1) })

/** A checkpoint as it was signed. */
export interface CheckpointLine {
  number: number
  at: string
  seq: number
  events: number
  cylinders: number
  /** Base64 of the Merkle root. */
  root: string
  /** SHA-256 of its note, which the next checkpoint names. */
  hash: string
  /** null for the daily one. */
  askedBy: { id: string, name: string } | null
}

/** What GET /api/log/checkpoints answers. */
export interface CheckpointsAnswer extends Page<CheckpointLine> {
  /** The key that signs them, as C2SP signed-note writes it. */
  publicKey: string
}

/** GET /api/log/head. */
export interface LogHead { seq: number, events: number, checkpoint: CheckpointLine | null }

/** Something that verifying found. */
export interface LogDamage {
  /** A code: what is wrong. */
  kind: string
  cylinderId: string | null
  version: number | null
  /** The number of a line, or of the first of several. */
  seq: number | null
  checkpoint: number | null
  because: string
}

/** GET /api/log/verify. */
export interface LogVerification {
  ok: boolean
  scope: VerifyScope
  /** Events whose chain was computed again, or that were folded again. */
  checked: number
  cylinders: number
  firstBad?: LogDamage
  /** The first ones found. */
  damage: LogDamage[]
  /** How many were found in all. */
  found: number
  /** Checkpoints whose signature, chain and root were verified. */
  checkpoints: number
  /** The checkpoint that verifying began from; null where it began at the beginning. */
  since: number | null
  /** The newest of the checkpoints that were verified; null where there is none. */
  upTo: number | null
  verifiedAt: string
}

/** While verifying: how far it has come. */
export interface VerifyProgress { done: number, of: number }
