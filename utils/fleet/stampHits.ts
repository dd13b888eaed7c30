import type { CylinderRow } from '../custody/cylinderView'

/**
 * The cylinders whose stamped serial has these characters, those first that end with them; what only has them in its
 * label, its refrigerant or its place is none.
 *
 * Shape: upper and lower case, spaces and hyphens are alike.
 */
export function stampHits<R extends Pick<CylinderRow, 'serial'>>(rows: readonly R[], typed: string): R[] {
  const text = squeezed(typed)
  const having = rows.filter(({ serial }) => serial !== null && squeezed(serial).includes(text))
  const isEnd = ({ serial }: R) => squeezed(serial ?? '').endsWith(text)
  return [...having.filter(isEnd), ...having.filter(row => !isEnd(row))]
}

function squeezed(text: string): string {
  return text.toUpperCase().replace(/[\s-]/g, '')
}
