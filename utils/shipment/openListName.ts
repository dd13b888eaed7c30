import type { OpenList } from '../custody/cylinderView'
import { shipmentName } from './shipmentName'

/** What the open list is called that a cylinder stands on, in a sentence. @example openListName({ kind: 'test-lot', id, number: 12 }) // 'test lot 12' */
export function openListName(list: OpenList): string {
  return list.kind === 'shipment' ? shipmentName(list).toLowerCase() : `test lot ${list.number}`
}

/** The page of an open list. */
export function openListPath({ kind, id }: OpenList): string {
  return kind === 'shipment' ? `/shipments/${id}` : `/retests/${id}`
}
