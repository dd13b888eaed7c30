import type { DecimalSign } from './csvFigure'
import type { LineFigures } from './figures'
import { readHeader, type ReadHeader, type StatementColumn } from './statementColumns'
import { readRow, type RowFigures, type RowProblem } from './statementRow'

/** A line that a row of a statement may belong to. */
export interface KnownLine { cylinderId: string, serial: string | null, figures: LineFigures }

/** How a file is to be read. */
export interface StatementReading {
  decimal: DecimalSign
  /** Unit of the weights where no column says it; null where nobody chose one. */
  unit: 'lb' | 'kg' | null
  /** By our names, the name of the column in the file. */
  columns?: Partial<Record<StatementColumn, string>>
}

/** A row of a file as its cells, with the line of the file that it stands on, from 1. */
export interface TableRow { row: number, cells: readonly string[] }

/** One figure that taking over would put in the place of another. */
export interface FigureChange<K extends keyof LineFigures = keyof LineFigures> { field: K, from: LineFigures[K], to: LineFigures[K] }

/** A row of the file beside the line that it belongs to. */
export interface PreviewRow {
  /** The line of the file that it stands on, from 1. */
  row: number
  serial: string
  cylinderId: string | null
  /** A row with any problem is not taken over. */
  problems: RowProblem[]
  changes: FigureChange[]
}

/** What taking a statement over would do; nothing of it is done yet. */
export interface StatementPreview {
  header: ReadHeader
  rows: PreviewRow[]
  /** Lines that no row names. */
  notNamed: string[]
}

/**
 * A serial as it is compared: stamps are written with and without spaces and dashes, in either case; an apostrophe before
 * it only keeps a spreadsheet from working it out as a formula.
 */
export function comparedSerial(serial: string): string {
  return serial.toUpperCase().replace(/^'/, '').replace(/[\s\-–.]/g, '')
}

/**
 * Puts the rows of a statement beside the lines of the shipment, by serial, and says row by row what would change and
 * what is wrong. Where the header cannot be read there are no rows.
 */
export function statementPreview(table: readonly TableRow[], lines: readonly KnownLine[], reading: StatementReading): StatementPreview {
  const header = readHeader(table[0]?.cells ?? [], reading.columns)
  if (header.problems.length > 0) return { header, rows: [], notNamed: [] }
  const linesOf = bySerials(lines)
  const named = table.slice(1).map(({ row, cells }) => ({ row, ...readRow(cells, header.mapping, reading.decimal, reading.unit) }))
  const rowsOf = bySerials(named)

  const rows = named.map(({ row, serial, figures, problems }): PreviewRow => {
    const found = serial === '' ? [] : linesOf.get(comparedSerial(serial)) ?? []
    const twins = serial === '' ? [] : rowsOf.get(comparedSerial(serial))!
    const line = found.length === 1 ? found[0]! : null
    const all = [
      ...problems,
      ...serial !== '' && found.length === 0 ? [ofSerial('No line of this shipment has this serial')] : [],
      ...found.length > 1 ? [ofSerial('Several lines of this shipment have this serial: enter them by hand')] : [],
      ...twins.length > 1 ? [ofSerial(`Stands ${twins.length} times in the file: rows ${twins.map(twin => twin.row).join(', ')}`)] : [],
    ]
    return { row, serial, cylinderId: line?.cylinderId ?? null, problems: all, changes: line && all.length === 0 ? changesOf(line.figures, figures) : [] }
  })
  const met = new Set(rows.flatMap(({ cylinderId }) => cylinderId ?? []))
  return { header, rows, notNamed: lines.map(({ cylinderId }) => cylinderId).filter(id => !met.has(id)) }
}

/** The figures of a line once a row is taken over. */
export function withChanges(figures: LineFigures, changes: readonly FigureChange[]): LineFigures {
  return { ...figures, ...Object.fromEntries(changes.map(({ field, to }) => [field, to])) }
}

/** The figures in which a line differs from what it was. */
export function changesOfLine(before: LineFigures, after: LineFigures): FigureChange[] {
  return (Object.keys(after) as (keyof LineFigures)[])
    .filter(field => !isSame(before[field], after[field]))
    .map(field => ({ field, from: before[field], to: after[field] }))
}

/** A line of which the statement accepts a net was taken over, unless a person said something else. */
function changesOf(before: LineFigures, row: RowFigures): FigureChange[] {
  return changesOfLine(before, { ...before, ...row, outcome: before.outcome ?? (row.acceptedNet ? 'taken-over' : null) })
}

// Readings and rates are plain records with their keys in one order only by chance.
function isSame(a: unknown, b: unknown): boolean {
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return a === b
  const [left, right] = [a as Record<string, unknown>, b as Record<string, unknown>]
  return Object.keys(left).length === Object.keys(right).length && Object.keys(left).every(key => left[key] === right[key])
}

function bySerials<T extends { serial: string | null }>(all: readonly T[]): Map<string, T[]> {
  const groups = new Map<string, T[]>()
  for (const one of all) {
    if (one.serial === null || one.serial === '') continue
    const key = comparedSerial(one.serial)
    groups.set(key, [...groups.get(key) ?? [], one])
  }
  return groups
}

function ofSerial(text: string): RowProblem {
  return { column: 'serial', text }
}
