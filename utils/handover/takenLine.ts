import type { CylinderView } from '../custody/cylinderView'
import type { Finding } from '../custody/finding'

/** A cylinder of an offer, as far as the phone that takes it knows it. */
export interface OfferedCylinder {
  /** As the offer names it. */
  reference: string
  /** Null where this phone's copy does not have it. */
  view: CylinderView | null
  /** Why it could not be looked up, where that was not for want of knowing it. */
  problem: string | null
}

/** What is said of it before it is taken. */
export interface TakenLine {
  /** It can be recorded now that this person has it. */
  canTake: boolean
  /** What stands against it, or in the way, in sentences. */
  notes: string[]
  findings: Finding[]
}

/** What the person who takes a cylinder is told of it; nothing that is found is left out. */
export function takenLine({ view, problem }: OfferedCylinder, giverId: string, takerId: string): TakenLine {
  if (!view) return { canTake: false, notes: [problem ?? 'This phone’s copy does not have it. Take it once there is signal.'], findings: [] }
  const { holder, findings } = view
  if (holder?.id === takerId) return { canTake: false, notes: ['You hold it already.'], findings }
  const otherwise = holder === null ? 'nobody holds it; it stands at its place' : holder.id === giverId ? null : `${holder.name} holds it`
  return { canTake: true, notes: otherwise ? [`As far as this phone knows ${otherwise}.`] : [], findings }
}
