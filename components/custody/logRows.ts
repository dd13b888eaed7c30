import type { LogLine } from '~~/utils/custody/cylinderView'
import { netChangeGrams, signedMass } from '~~/utils/picture/custodyLine'
import { gapBefore, lateBy } from '~~/utils/picture/logTable'
import { columnFigure, signedColumnFigure } from '~~/utils/quantity/columnFigure'
import { formatInstant } from '~~/utils/quantity/instant'
import { formatMass, formatReading, type MassReading, type MassUnit } from '~~/utils/quantity/mass'
import { lineVerb, lineWords } from './lines'

/** How a custody log is read. */
interface Reading {
  unit: MassUnit
  timeZone: string
  nowMs: number
  /** Who reads: that person signs what waits for their signature. */
  readerId: string | null
  /** Corrections stand in the place of what they mend; else each line reads as it was recorded. */
  applied?: boolean
  /** All lines are shown: then gaps between them are real. */
  whole: boolean
}

/** The unit that the head of a column of weights names; '' where each figure names its own. */
export function unitInHead(unit: MassUnit): string {
  return unit === 'lb-oz' ? '' : unit
}

/** The lines of a custody log in the words and figures of its table, in their order. Rounding: nets to the nearest. */
export function logRows(lines: readonly LogLine[], { unit, timeZone, nowMs, readerId, applied, whole }: Reading) {
  const byId = new Map(lines.map(line => [line.id, line]))
  const correctionOf = new Map(lines.filter(line => line.kind === 'corrected').map(line => [line.id, (line.details as { eventId: string }).eventId]))
  // By the signature, the line that it signs.
  const signatureOf = new Map(lines.flatMap(line => line.signature?.by ? [[line.signature.by, line] as const] : []))
  return lines.map((line, index) => {
    const words = lineWords(applied && line.instead !== undefined ? { ...line, details: line.instead } : line)
    const change = netChangeGrams(line)
    const mends = correctionOf.get(line.id)
    return {
      line,
      verb: lineVerb(line),
      what: words.what,
      other: words.other,
      place: words.to,
      occurred: formatInstant(Date.parse(line.occurredAt), timeZone, nowMs),
      recorded: formatInstant(Date.parse(line.recordedAt), timeZone, nowMs),
      late: lateBy(line),
      gross: words.gross && grossText(words.gross, unit),
      change: change === null ? null : change === 0 ? '' : signedColumnFigure(change, unit),
      net: line.netAfterGrams === null ? null : columnFigure(line.netAfterGrams, unit, 'nearest'),
      // A card has no head that names the unit.
      changeText: change === null ? '–' : change === 0 ? '' : signedMass(change, unit),
      netText: line.netAfterGrams === null ? '–' : formatMass(line.netAfterGrams, unit, 'nearest'),
      hands: [`, ${line.author.name}`, line.supervisor && ` under ${line.supervisor.name}`, words.to && `, ${words.to}`].filter(Boolean).join(''),
      correctedBecause: applied && line.correction ? line.correction.reason : null,
      mends: mends === undefined ? null : byId.get(mends) ?? null,
      mendedBy: line.correction ? byId.get(line.correction.eventId) ?? null : null,
      signs: signatureOf.get(line.id) ?? null,
      signedBy: line.signature?.by ? byId.get(line.signature.by) ?? null : null,
      isToSign: line.signature?.by === null && line.supervisor !== null && line.supervisor.id === readerId,
      gap: whole ? gapBefore(lines, index, timeZone) : null,
    }
  })
}

// As it was entered; its unit stands in the header where it is the same.
function grossText(reading: MassReading, unit: MassUnit): string {
  const text = formatReading(reading)
  const symbol = unitInHead(unit)
  return reading.unit === unit && symbol ? text.replace(`\u00A0${symbol}`, '') : text
}
