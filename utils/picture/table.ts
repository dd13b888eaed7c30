/** One column of a table as a screen draws it. */
export type TableColumn = {
  key: string
  label: string
  /** Figures stand at the right, so that their decimal points line up. */
  align?: 'start' | 'end'
  /** Set in the fixed-width face. */
  figure?: boolean
  sortable?: boolean
  /** The column that names its row, read out before each cell. */
  names?: boolean
  /** Stays in sight at this width while the rest scrolls sideways. */
  stick?: string
  /** The header is read out but not drawn. */
  quiet?: boolean
}

/** The column that a table is sorted by. */
export type TableSort = { key: string, descending: boolean }

/**
 * Gives the distance from the left at which each kept column stands, as a CSS length; null for a column that scrolls.
 * `lead` is the width of what stands before the first column, such as the boxes for choosing rows.
 */
export function stickyOffsets(columns: readonly TableColumn[], lead: string): (string | null)[] {
  const before = [lead]
  return columns.map((column) => {
    if (column.stick === undefined) return null
    const left = `calc(${before.join(' + ')})`
    before.push(column.stick)
    return left
  })
}
