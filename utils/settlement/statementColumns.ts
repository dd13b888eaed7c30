/** The columns of a statement's table of values by our own names, in the order of the template. */
export const STATEMENT_COLUMNS = ['serial', 'gross', 'net', 'unit', 'grade', 'price', 'per', 'credit'] as const
export type StatementColumn = (typeof STATEMENT_COLUMNS)[number]

/** What each column holds. */
export const COLUMN_WORDS: Record<StatementColumn, string> = {
  serial: 'Serial as stamped on the cylinder',
  gross: 'Gross weight on the reclaimer’s scale',
  net: 'Net weight accepted',
  unit: 'Unit of both weights: lb or kg',
  grade: 'Grade given',
  price: 'Price for each unit of mass; negative is charged',
  per: 'Unit that the price is for: lb or kg',
  credit: 'Credit for the line; negative is charged',
}

/** Which column of a file holds what, by its place from 0; null where none does. */
export type ColumnMapping = Record<StatementColumn, number | null>

/** What was found in the first row of a file. */
export interface ReadHeader {
  mapping: ColumnMapping
  /** What is wrong with it, a sentence each; empty where its rows can be read. */
  problems: string[]
  /** Names that are none of ours and were not chosen for a column. */
  notOurs: string[]
}

/**
 * Finds our columns in a header, in any case and order; where a person chose columns, those count instead.
 *
 * @param chosen by our names, the name that stands in the file.
 */
export function readHeader(header: readonly string[], chosen: Partial<Record<StatementColumn, string>> = {}): ReadHeader {
  const names = header.map(nameOf)
  const mapping = {} as ColumnMapping
  const problems: string[] = []
  for (const column of STATEMENT_COLUMNS) {
    const wanted = nameOf(chosen[column] ?? column)
    const at = names.indexOf(wanted)
    mapping[column] = at < 0 ? null : at
    if (chosen[column] !== undefined && at < 0) problems.push(`No column is called “${chosen[column]}”.`)
    if (at >= 0 && names.indexOf(wanted, at + 1) >= 0) problems.push(`Two columns are called “${header[at]!.trim()}”.`)
  }
  const taken = Object.values(mapping).filter(at => at !== null)
  if (new Set(taken).size < taken.length) problems.push('One column of the file was chosen for two of ours.')
  if (mapping.serial === null) problems.push('No column holds the serials: choose which one does.')
  if (mapping.serial !== null && taken.length === 1) problems.push('No column holds a figure: choose which ones do.')
  const notOurs = header.filter((name, at) => name.trim() !== '' && !taken.includes(at))
  return { mapping, problems, notOurs }
}

function nameOf(text: string): string {
  return text.trim().toLowerCase()
}
