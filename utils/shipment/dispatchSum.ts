import { excessGrams } from '../capacity/stopWeight'
import type { ShipmentLine } from '../contract/shipments'
import { exactGrams, formatMass, readingGrams, type MassReading, type MassUnit } from '../quantity/mass'
import { scaleAccuracyGrams } from '../quantity/scale'

/** One line as it is about to leave: what the scale showed, and what follows from it. */
export interface WeighedLine {
  line: ShipmentLine
  gross: MassReading | null
  grossGrams: number | null
  /** Gross less tare; null where either is not known. */
  netGrams: number | null
  /** How far the net has come from the last known one, where that is beyond both weighings' accuracy. */
  changedGrams: number | null
  /** The scale shows more than the cylinder may hold. */
  over: boolean
}

/** What all lines come to. */
export interface DispatchSum { weighed: number, grossGrams: number, netGrams: number | null, nets: number }

/** Puts what the scale shows beside a line of a shipment; by default what was kept of it. */
export function weighedLine(line: ShipmentLine, gross: MassReading | null = line.weighed?.gross ?? null): WeighedLine {
  const { cylinder } = line
  const grossGrams = gross === null ? null : readingGrams(gross)
  const netGrams = grossGrams === null || cylinder.tareWeightGrams === null ? null : grossGrams - cylinder.tareWeightGrams
  return {
    line, gross, grossGrams, netGrams,
    changedGrams: changed(netGrams, grossGrams, cylinder.netGrams, cylinder.tareWeightGrams),
    over: gross !== null && isOver(gross, netGrams, cylinder),
  }
}

/** What is to be looked at again of a weight; null where nothing. */
export function weighingWord({ over, changedGrams }: WeighedLine, unit: MassUnit): { kind: 'stop' | 'att', text: string } | null {
  if (over) return { kind: 'stop', text: 'Above its fill limit: it may not leave.' }
  if (changedGrams === null) return null
  return { kind: 'att', text: `${formatMass(Math.abs(changedGrams), unit, 'nearest')} ${changedGrams < 0 ? 'less' : 'more'} than last known. Weigh it again.` }
}

/** Adds up a shipment: what is weighed, and of it what has a net. */
export function dispatchSum(lines: readonly WeighedLine[]): DispatchSum {
  const weighed = lines.filter(line => line.grossGrams !== null)
  const nets = weighed.flatMap(line => line.netGrams ?? [])
  return {
    weighed: weighed.length,
    grossGrams: weighed.reduce((sum, line) => sum + line.grossGrams!, 0),
    netGrams: nets.length ? nets.reduce((sum, net) => sum + net, 0) : null,
    nets: nets.length,
  }
}

// By the stop weight where there is one, for whole grams would show a cylinder filled to it as a hair above.
function isOver(gross: MassReading, netGrams: number | null, cylinder: ShipmentLine['cylinder']): boolean {
  const { exactStopWeightGrams, fillLimitGrams } = cylinder
  if (exactStopWeightGrams !== null) return excessGrams(exactStopWeightGrams, exactGrams(gross)) > 0
  return netGrams !== null && fillLimitGrams !== null && netGrams > fillLimitGrams
}

function changed(netGrams: number | null, grossGrams: number | null, knownNet: number | null, tare: number | null): number | null {
  if (netGrams === null || grossGrams === null || knownNet === null || tare === null) return null
  const difference = netGrams - knownNet
  return Math.abs(difference) > scaleAccuracyGrams(grossGrams) + scaleAccuracyGrams(tare + knownNet) ? difference : null
}
