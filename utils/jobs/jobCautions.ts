import type { JobCaution, JobFill } from '../contract/jobs'
import { massWords } from '../custody/findings/words'
import { readingGrams, type MassReading } from '../quantity/mass'
import { systemDependentLimit } from '../recovery/systemDependentLimit'
import { recoveredGrams } from './jobFills'

/** What of a job its cautions rest on. */
export interface JudgedJob { refrigerant: string | null, charge: MassReading | null }

/** What speaks about a job's recovery, the gravest first. */
export function jobCautions({ refrigerant, charge }: JudgedJob, fills: readonly JobFill[]): JobCaution[] {
  const counting = fills.filter(({ apart }) => apart !== 'practice')
  const chargeGrams = charge === null ? null : readingGrams(charge)
  return [
    ...level(counting),
    ...ownCompressor(counting, chargeGrams),
    ...moreThanCharge(counting, chargeGrams),
    ...otherName(counting, refrigerant),
    ...disposal(counting, refrigerant, chargeGrams),
    ...notCertified(counting),
  ]
}

// The last that was read tells what the system was left at.
function level(fills: readonly JobFill[]): JobCaution[] {
  if (fills.length === 0) return []
  const last = fills.findLast(({ reached }) => reached !== null)?.reached
  const source = '40 CFR 82.156(a), Table 1'
  if (!last) return [{ code: 'vacuum-level', text: 'No vacuum was recorded. Whether the equipment was brought down far enough is not known.', source }]
  return last.verdict === 'reached' ? [] : [{ code: 'vacuum-level', text: last.because, source }]
}

function ownCompressor(fills: readonly JobFill[], chargeGrams: number | null): JobCaution[] {
  if (!fills.some(({ method }) => method === 'own-compressor')) return []
  const limit = systemDependentLimit({ chargeGrams, isFixedPumpOut: false })
  return limit ? [{ code: 'system-dependent-limit', text: `It came out with the system's own compressor. ${limit.text}`, source: limit.source }] : []
}

function moreThanCharge(fills: readonly JobFill[], chargeGrams: number | null): JobCaution[] {
  const out = recoveredGrams(fills)
  if (out === null || chargeGrams === null) return []
  const doubt = fills.reduce((sum, { uncertaintyGrams }) => sum + (uncertaintyGrams ?? 0), 0)
  if (out - doubt <= chargeGrams) return []
  return [{ code: 'weigh-again', text: `More came out (${massWords(out, 'nearest')}) than the charge that was said (${massWords(chargeGrams, 'nearest')}). Look at the weights and at the nameplate.`, source: 'common practice, no source' }]
}

function otherName(fills: readonly JobFill[], refrigerant: string | null): JobCaution[] {
  const names = new Set([...refrigerant === null ? [] : [refrigerant], ...fills.flatMap(fill => fill.refrigerant ?? [])])
  if (names.size <= 1) return []
  return [{ code: 'two-refrigerants', text: `${[...names].join(' and ')} are named of one job. Look at the nameplate and at the cylinders.`, source: 'common practice, no source' }]
}

function notCertified(fills: readonly JobFill[]): JobCaution[] {
  const names = [...new Set(fills.filter(({ by, supervisor }) => by.certification === null && (supervisor?.certification ?? null) === null).map(({ by }) => by.name))]
  if (names.length === 0) return []
  return [{ code: 'not-certified', text: `No certification is on record of ${names.join(' and ')}. Only certified technicians open the circuit.`, source: '40 CFR 82.161' }]
}

/** Whoever recovers from an appliance above and under this, and it is disposed of, keeps its refrigerant, place and day for three years. Units: grams; five and fifty pounds as whole grams read them. Source: 40 CFR 82.156(a)(3). */
const DISPOSAL_RECORD_GRAMS = { above: 2_268, under: 22_680 } as const

function disposal(fills: readonly JobFill[], refrigerant: string | null, chargeGrams: number | null): JobCaution[] {
  if (chargeGrams === null || chargeGrams <= DISPOSAL_RECORD_GRAMS.above || chargeGrams >= DISPOSAL_RECORD_GRAMS.under) return []
  if (refrigerant !== null || fills.some(fill => fill.refrigerant !== null)) return []
  return [{ code: 'disposal-record', text: 'Where this equipment is disposed of, its record needs the kind of refrigerant, and nobody has said it.', source: '40 CFR 82.156(a)(3)' }]
}
