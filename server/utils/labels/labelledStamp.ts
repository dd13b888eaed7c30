import type { Stamp } from '~~/utils/capacity/types'
import type { CylinderState } from '~~/utils/custody/state'
import type { LabelledStamp } from '~~/utils/label/identityContent'
import { formatReading, nearestToDivision, type MassReading } from '~~/utils/quantity/mass'

/** What of a collar stands on its label, as entered; a tare that was weighed anew in place of the stamped one. */
export function labelledStamp(stamp: Stamp, tare: CylinderState['tare']): LabelledStamp {
  const tareWeight = tareReading(stamp, tare)
  return {
    serial: stamp.serial,
    spec: stamp.spec,
    servicePressurePsig: stamp.servicePressurePsig,
    tareWeight: tareWeight && formatReading(tareWeight),
    waterCapacity: stamp.waterCapacity && formatReading(stamp.waterCapacity),
  }
}

/** The tare in force: the stamped one, or what was weighed anew. Rounding: a new one to the nearest division of a scale in the stamp's unit. */
export function tareReading(stamp: Stamp, tare: CylinderState['tare']): MassReading | null {
  return tare?.isWeighedAnew ? nearestToDivision(tare.exactGrams, stamp.tareWeight?.unit ?? 'lb') : stamp.tareWeight
}
