import type { CylinderRow } from '../custody/cylinderView'

/** What is shown of the cylinders that have some typed characters in their stamp. */
export interface StampFound<R = CylinderRow> {
  rows: R[]
  /** How many others have them too. */
  more: number
  /** There may be still more: not all of the fleet that came into question was read. */
  isMoreUnread: boolean
}

/** As many as are told apart at a glance. */
const MOST_SHOWN = 20

/**
 * The cylinders whose stamped serial has these characters, those first that end with them; what only has them in its
 * label, its refrigerant or its place is none.
 *
 * Shape: upper and lower case, spaces and hyphens are alike. `total` is how many came into question, of which `rows`
 * were read.
 */
export function stampFound<R extends Pick<CylinderRow, 'serial'>>(rows: readonly R[], typed: string, total: number): StampFound<R> {
  const having = rows.filter(({ serial }) => serial !== null && squeezed(serial).includes(squeezed(typed)))
  const isEnd = ({ serial }: R) => endsStamp(serial, typed)
  const hits = [...having.filter(isEnd), ...having.filter(row => !isEnd(row))]
  return { rows: hits.slice(0, MOST_SHOWN), more: Math.max(0, hits.length - MOST_SHOWN), isMoreUnread: total > rows.length }
}

/** Whether a stamped serial ends with some typed characters, case, spaces and hyphens being alike. */
export function endsStamp(serial: string | null, typed: string): boolean {
  return serial !== null && squeezed(serial).endsWith(squeezed(typed))
}

/** How many others there are, in words; null where there are none. */
export function moreInWords({ more, isMoreUnread }: Pick<StampFound, 'more' | 'isMoreUnread'>): string | null {
  if (more === 0) return isMoreUnread ? 'There may be more with these characters.' : null
  return `${more}${isMoreUnread ? ' or more' : ''} ${more === 1 && !isMoreUnread ? 'other has' : 'others have'} these characters too.`
}

/** Characters as a stamp is searched by: upper and lower case, spaces and hyphens are alike. */
export function squeezed(text: string): string {
  return text.toUpperCase().replace(/[\s-]/g, '')
}
