import type { CylinderView, LogLine } from '../custody/cylinderView'
import type { MassReading } from '../quantity/mass'

/** Who did it and when. Units: UTC milliseconds. */
export type Deed = { atMs: number, by: string }

/** The lines of a custody log that a stop weight rests on; null where the log has none. */
export type SumSources = {
  /** The reading of the scale that the present net comes from. */
  weighing: (Deed & { gross: MassReading }) | null
  /** The stamp, read at registration. */
  stampRead: Deed | null
  /** The tare that a retest set in place of the stamped one. */
  newTare: (Deed & { tare: MassReading }) | null
}

/**
 * Finds where the figures of a sum were read; a corrected line counts with what was put in its place.
 *
 * Shape: the lines in order of effect, newest first. A net that was reckoned has no reading behind it.
 */
export function sumSources(lines: readonly LogLine[], { basis, asOf }: Pick<CylinderView['contents'], 'basis' | 'asOf'>): SumSources {
  const inForce = lines.filter(line => !line.correction?.takenOut).map(line => ({ line, details: detailsInForce(line, lines) }))
  const registered = inForce.findLast(({ line }) => line.kind === 'registered')
  let weighing: SumSources['weighing'] = null
  let newTare: SumSources['newTare'] = null
  for (const { line, details } of inForce) {
    const gross = details.grossAfter ?? details.gross
    if (!weighing && gross && basis === 'weighed' && asOf !== null && Date.parse(line.effectiveAt) <= Date.parse(asOf)) weighing = { ...deed(line), gross }
    if (!newTare && details.newTare) newTare = { ...deed(line), tare: details.newTare }
  }
  return { weighing, stampRead: registered ? deed(registered.line) : null, newTare }
}

// Of all kinds together, what here is looked for; each was held to its schema when it was recorded.
type Readings = { gross?: MassReading, grossAfter?: MassReading, newTare?: MassReading }

function detailsInForce(line: LogLine, lines: readonly LogLine[]): Readings {
  const correcting = line.correction && lines.find(other => other.id === line.correction?.eventId)
  const instead = correcting && (correcting.details as { instead?: Readings }).instead
  return instead ?? line.details as Readings
}

function deed(line: LogLine): Deed {
  return { atMs: Date.parse(line.occurredAt), by: line.author.name }
}
