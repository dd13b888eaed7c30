import type { Stamp } from '../capacity/types'
import { formatReading, type MassReading } from '../quantity/mass'

/** The marks of a collar stamp as the plate shows them; null is not known. */
export interface PlateMarks { specification: string | null, waterCapacity: string | null, tareWeight: string | null }

/**
 * A collar stamp on its plate: specification and pressure run together as they are struck, the unit once where both
 * weights have the same.
 */
export function stampOnPlate({ spec, servicePressurePsig, waterCapacity, tareWeight }: Stamp): PlateMarks {
  const mark = spec.replace(/^DOT-/, '')
  const pressure = servicePressurePsig === null ? '' : `${/\d$/.test(mark) ? '-' : ''}${servicePressurePsig}`
  return {
    specification: mark + pressure,
    waterCapacity: waterCapacity && (tareWeight && isSameUnit(waterCapacity, tareWeight) ? withoutUnit(waterCapacity) : formatReading(waterCapacity)),
    tareWeight: tareWeight && formatReading(tareWeight),
  }
}

function isSameUnit(a: MassReading, b: MassReading): boolean {
  return a.unit === b.unit && a.unit !== 'lb-oz'
}

function withoutUnit(reading: MassReading): string {
  return formatReading(reading).split('\u00A0')[0]!
}
