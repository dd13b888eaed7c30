import type { Half } from './half'

/** What the logs of other cylinders say that bears on one: its own fold reads nothing but its own events. */
export interface SaidByOthers {
  /** Label codes of this cylinder that another one claims too. */
  codesOnTwo: ReadonlySet<string>
  /** The halves of other cylinders that name this one, each cylinder's in order of effect. */
  otherHalves: readonly Half[]
}

/** Of what no other cylinder says anything. */
export const NOTHING_SAID: SaidByOthers = { codesOnTwo: new Set(), otherHalves: [] }
