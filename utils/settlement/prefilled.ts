import type { DockLine } from '../dock/dockLines'
import type { Rate } from '../reclaim/price'
import type { LineFigures } from './figures'

/** What the dock said of a line over its link. */
export type DockSaid = Pick<DockLine, 'theirGross' | 'missing' | 'grade' | 'acceptedNet' | 'sentBack'>

/** A line's figures where nobody has typed any: what the dock said, and the price that held on the day it left. */
export function prefilled(dock: DockSaid | undefined, rate: Rate | null): LineFigures {
  return {
    theirGross: dock?.theirGross ?? null,
    acceptedNet: dock?.acceptedNet ?? null,
    grade: dock?.grade ?? null,
    rate,
    statedCents: null,
    outcome: outcomeOf(dock),
  }
}

function outcomeOf(dock: DockSaid | undefined): LineFigures['outcome'] {
  if (!dock) return null
  if (dock.sentBack) return 'sent-back'
  if (dock.missing) return 'not-arrived'
  return dock.acceptedNet === null ? null : 'taken-over'
}
