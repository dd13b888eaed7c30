import { systemDependentLimit } from '../../recovery/systemDependentLimit'
import type { Finding } from '../finding'
import { massWords } from './words'

/**
 * More came out with the system's own compressor than it may be used for; null where not.
 *
 * What came out proves the charge: it was no less.
 */
export function beyondOwnCompressor(recoveredGrams: number): Finding | null {
  const limit = systemDependentLimit({ chargeGrams: recoveredGrams, isFixedPumpOut: false })
  return limit && {
    code: 'system-dependent-limit', severity: 'caution', source: limit.source, since: null,
    text: `${massWords(recoveredGrams, 'nearest')} came out with the system's own compressor. ${limit.text}`,
  }
}
