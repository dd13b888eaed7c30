import { create } from 'qrcode'

/** The error correction levels of ISO/IEC 18004, weakest first. */
export type CorrectionLevel = 'L' | 'M' | 'Q' | 'H'

/** A QR symbol as it was encoded: its version and its dark modules by row. */
export interface QrMatrix {
  version: number
  rows: boolean[][]
}

/**
 * The smallest QR symbol that holds this payload at this level of error correction.
 *
 * Errors: Error of the encoder where no version is large enough.
 */
export function qrMatrix(payload: string, level: CorrectionLevel): QrMatrix {
  const { version, modules } = create(payload, { errorCorrectionLevel: level })
  const places = Array.from({ length: modules.size }, (_, place) => place)
  return { version, rows: places.map(row => places.map(column => Boolean(modules.get(row, column)))) }
}
