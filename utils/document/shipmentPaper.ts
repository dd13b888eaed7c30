import type { Paper } from './paper'
import { shipmentName } from '../shipment/shipmentName'

/** A shipment as it is called within a line. @example shipmentWord({ number: 4 }) // 'shipment 0004' */
export function shipmentWord(shipment: { number: number }): string {
  return shipmentName(shipment).toLowerCase()
}

/** What stands large on each page of a paper that is no paper yet. */
export function draftMark(isDraft: boolean): Pick<Paper, 'mark'> {
  return isDraft ? { mark: 'DRAFT, not for the road' } : {}
}
