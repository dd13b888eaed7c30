import type { Stamp } from '~~/utils/capacity/types'
import type { CylinderState } from '~~/utils/custody/state'
import type { LabelledStamp } from '~~/utils/label/identityContent'
import { formatReading, nearestToDivision } from '~~/utils/quantity/mass'

/**
 * What of a collar stands on its label, as entered; a tare that was weighed anew in place of the stamped one.
 *
 * Rounding: a new tare to the nearest division of a scale in the stamp's unit.
 */
export function labelledStamp(stamp: Stamp, tare: CylinderState['tare']): LabelledStamp {
  const tareUnit = stamp.tareWeight?.unit ?? 'lb'
  return {
    serial: stamp.serial,
    spec: stamp.spec,
    servicePressurePsig: stamp.servicePressurePsig,
    tareWeight: tare?.isWeighedAnew
      ? formatReading(nearestToDivision(tare.exactGrams, tareUnit))
      : stamp.tareWeight && formatReading(stamp.tareWeight),
    waterCapacity: stamp.waterCapacity && formatReading(stamp.waterCapacity),
  }
}
