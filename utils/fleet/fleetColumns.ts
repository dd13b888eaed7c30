import type { FleetQuery } from '../contract/custody'
import type { FleetColumn } from '../contract/fleetLayout'
import { columnUnit } from '../quantity/columnFigure'
import type { MassUnit } from '../quantity/mass'

interface ColumnWords {
  head: string
  /** By which the server sorts it; null where there is no order in it. */
  sort: FleetQuery['sort'] | null
  /** Its figures are masses, whose unit stands in the head. */
  isMass?: boolean
}

/** The head of each column of the fleet, and what it is sorted by. */
export const FLEET_COLUMN_WORDS: Record<FleetColumn, ColumnWords> = {
  code: { head: 'Code', sort: 'code' },
  verdict: { head: 'Verdict', sort: 'urgency' },
  refrigerant: { head: 'Refrigerant', sort: 'refrigerant' },
  net: { head: 'Net / fill limit', sort: 'net', isMass: true },
  rule: { head: 'Limit by', sort: null },
  room: { head: 'Room', sort: 'room', isMass: true },
  stop: { head: 'Stop', sort: 'stop', isMass: true },
  retest: { head: 'Retest', sort: 'due' },
  place: { head: 'Place', sort: 'place' },
  last: { head: 'Last event', sort: 'last-event' },
  serial: { head: 'Serial', sort: 'serial' },
  spec: { head: 'Specification', sort: null },
  condition: { head: 'Condition', sort: 'condition' },
  lifecycle: { head: 'Stage of life', sort: 'lifecycle' },
  tare: { head: 'TW', sort: null, isMass: true },
  holder: { head: 'Holder', sort: null },
  owner: { head: 'Owner', sort: null },
}

/** The head of a column as it stands over figures in one unit. */
export function columnHead(column: FleetColumn, unit: MassUnit): string {
  const { head, isMass } = FLEET_COLUMN_WORDS[column]
  return isMass ? `${head}, ${columnUnit(unit)}` : head
}

/** The column that an order of the list shows at its head; null for one that none shows. */
export function columnOfSort(sort: FleetQuery['sort']): FleetColumn | null {
  const found = Object.entries(FLEET_COLUMN_WORDS).find(([, words]) => words.sort === sort)
  return found ? found[0] as FleetColumn : null
}

/** The columns with one of them a step earlier or later; as they were where it cannot go there. */
export function columnMoved(columns: readonly FleetColumn[], column: FleetColumn, step: -1 | 1, fixed: number): FleetColumn[] {
  const at = columns.indexOf(column)
  const to = at + step
  const moved = [...columns]
  if (at < fixed || to < fixed || to >= moved.length) return moved
  moved.splice(at, 1)
  moved.splice(to, 0, column)
  return moved
}
