/** GET /api/log/head. */
export interface LogHead { seq: number, events: number, checkpoint: null }

/** GET /api/log/verify. */
export interface LogVerification {
  ok: boolean
  /** Events whose chain was computed again. */
  checked: number
  cylinders: number
  firstBad?: { cylinderId: string, version: number, because: string }
  checkpoints: number
  verifiedAt: string
}
