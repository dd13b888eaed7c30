import type { CylinderView } from '../custody/cylinderView'
import type { CustodyEvent } from '../custody/event'
import type { ProblemDetails } from '../contract/problem'
import { formatLabelCode, isLabelCode } from '../label/code'
import { codeOrSerial } from '../label/codeOrSerial'
import type { MassUnit } from '../quantity/mass'
import { batchVerdict, type BatchQuestion, type BatchVerdict } from './batchVerdict'

/** What a scanned code was found to be on. */
export type BatchFound
  = | { is: 'looking' }
    | { is: 'known', view: CylinderView }
    | { is: 'unknown' }
    | { is: 'failed', problem: ProblemDetails }

/** One scan of a batch. */
export interface BatchScan {
  /** As scanned: a label code, or a cylinder's id where it was found by its stamp. */
  ref: string
  /** ISO 8601 with offset. */
  scannedAt: string
  found: BatchFound
  keepReason: string | null
  /** Which of two cylinders with one code is meant was said by its serial. */
  isChosen: boolean
  /** The id and the place in the device's count that its event went out with; sent again it keeps them. */
  sent: Pick<CustodyEvent, 'id' | 'deviceId' | 'deviceSeq'> | null
  /** Why the server did not record it. */
  problem: ProblemDetails | null
}

/** A scan with what is said of it. */
export interface BatchLine extends BatchScan {
  /** The code in threes, else the serial. */
  name: string
  /** null while it is looked up, where it is on no cylinder, and where it could not be asked. */
  verdict: BatchVerdict | null
}

/** A scan as a line of the list, judged anew whenever what it is judged against changes. */
export function batchLine(scan: BatchScan, question: Omit<BatchQuestion, 'keepReason' | 'isChosen'>, unit: MassUnit): BatchLine {
  const { found, keepReason, isChosen } = scan
  if (found.is !== 'known') return { ...scan, name: isLabelCode(scan.ref) ? formatLabelCode(scan.ref) : 'A cylinder', verdict: null }
  const { labelCode, stamp } = found.view
  return {
    ...scan,
    name: codeOrSerial({ labelCode: isChosen ? null : labelCode, serial: stamp?.serial ?? null }),
    verdict: batchVerdict(found.view, { ...question, keepReason, isChosen }, unit),
  }
}

/** Whether a line is among those that the one act at the end records. */
export function isCounted({ verdict }: BatchLine): boolean {
  return verdict?.standing === 'counted'
}
