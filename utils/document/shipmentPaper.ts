import type { Paper } from './paper'

/** A shipment as people call it. @example shipmentWord({ number: 4 }) // 'shipment 0004' */
export function shipmentWord({ number }: { number: number }): string {
  return `shipment ${String(number).padStart(4, '0')}`
}

/** What stands large on each page of a paper that is no paper yet. */
export function draftMark(isDraft: boolean): Pick<Paper, 'mark'> {
  return isDraft ? { mark: 'DRAFT, not for the road' } : {}
}
