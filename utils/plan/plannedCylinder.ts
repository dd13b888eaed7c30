import type { PlannedCylinder } from '../contract/plans'
import type { Planned } from '../custody/plan'

/** A cylinder as a plan finds it; what the plan makes of it is added there. */
export function plannedCylinder(view: Planned, nameOfFirm: (id: string) => string): PlannedCylinder {
  const { contents, stamp, capacity } = view
  const [owner] = contents.owners
  return {
    id: view.id,
    labelCode: view.labelCode,
    serial: stamp?.serial ?? null,
    version: view.version,
    place: view.place,
    refrigerant: contents.refrigerant,
    condition: contents.condition,
    owner: owner?.ownerId ? nameOfFirm(owner.ownerId) : null,
    part: 'stays',
    beforeGrams: contents.netGrams,
    afterGrams: contents.netGrams,
    limitGrams: capacity.fillLimitGrams,
    waterCapacityGrams: stamp?.waterCapacityGrams ?? null,
    stopWeightGrams: capacity.stopWeightGrams,
    why: [],
  }
}
