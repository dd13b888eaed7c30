import type { FleetQuery } from '../../../utils/contract/custody'
import { foreignCursor } from '../http/cursor'

/** Where a page of the fleet ended: on one cylinder, by what it is sorted by, and which way to go on. */
export interface FleetCursor {
  isBackward: boolean
  stretch: number
  value: string | number | null
  id: string
}

type Order = Pick<FleetQuery, 'sort' | 'order'>

/** A cursor as text. It holds only for the order that it was made in. */
export function fleetCursorText(cursor: FleetCursor, { sort, order }: Order): string {
  return Buffer.from(JSON.stringify([sort, order, cursor.isBackward ? 0 : 1, cursor.stretch, cursor.value, cursor.id])).toString('base64url')
}

/** Reads a cursor; null where none is given. Errors: 400 for one that is none of ours, or of another order. */
export function readFleetCursor(text: string | undefined, { sort, order }: Order, stretches: number): FleetCursor | null {
  if (text === undefined) return null
  const parts = parsed(Buffer.from(text, 'base64url').toString('utf8'))
  if (!Array.isArray(parts) || parts.length !== 6) throw foreignCursor()
  const [ofSort, ofOrder, way, stretch, value, id] = parts as unknown[]
  const isStretch = Number.isInteger(stretch) && (stretch as number) >= 0 && (stretch as number) < stretches
  const isValue = value === null || typeof value === 'string' || Number.isFinite(value)
  if (ofSort !== sort || ofOrder !== order || (way !== 0 && way !== 1) || !isStretch || !isValue || typeof id !== 'string') throw foreignCursor()
  return { isBackward: way === 0, stretch: stretch as number, value: value as FleetCursor['value'], id }
}

function parsed(json: string): unknown {
  try {
    return JSON.parse(json)
  }
  catch {
    return null
  }
}
