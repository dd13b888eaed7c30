import type { MassReading } from '../quantity/mass'
import { csvFigure, type DecimalSign } from './csvFigure'
import type { LineFigures } from './figures'
import { STATEMENT_COLUMNS, type ColumnMapping, type StatementColumn } from './statementColumns'

/** What is wrong in a row, and in which of our columns; null for the row as a whole. */
export interface RowProblem { column: StatementColumn | null, text: string }

/** What a row says of a line: only what stands in it. */
export type RowFigures = Partial<Pick<LineFigures, 'theirGross' | 'acceptedNet' | 'grade' | 'rate' | 'statedCents'>>

/** A row as it was read. */
export interface ReadRow { serial: string, figures: RowFigures, problems: RowProblem[] }

type Unit = 'lb' | 'kg'

// As in the custody log, which these figures go into.
const MOST = { lb: 100_000, kg: 45_000 }
const MOST_MILLS = 1_000_000_000
const MOST_CENTS = 100_000_000_00
const LONGEST_GRADE = 80
const NOT_PRINTED = /[\p{Cc}\p{Cs}\u202A-\u202E\u2066-\u2069]/u

/**
 * Reads one row by the mapping of its file. A wrong field is told and its figure left out; nothing is guessed.
 *
 * @param unit that of the weights, where the file has no column for it.
 */
export function readRow(cells: readonly string[], mapping: ColumnMapping, decimal: DecimalSign, unit: Unit | null): ReadRow {
  const problems: RowProblem[] = []
  const figures: RowFigures = {}
  const text = Object.fromEntries(STATEMENT_COLUMNS.map(column => [column, textAt(cells, mapping[column])])) as Record<StatementColumn, string>
  const wrong = (column: StatementColumn | null, told: string): null => {
    problems.push({ column, text: told })
    return null
  }

  function figure(column: StatementColumn, mayBeNegative: boolean): { value: number, decimals: number } | null {
    const read = csvFigure(text[column], decimal)
    if ('wrong' in read) return wrong(column, read.wrong === 'ambiguous' ? `“${text[column]}” can be read in two ways: the file’s decimal sign is a ${decimal}` : `“${text[column]}” is no number`)
    if (read.value < 0 && !mayBeNegative) return wrong(column, `“${text[column]}” is below zero: a weight is not`)
    return read
  }

  function mass(column: 'gross' | 'net', of: Unit | null): MassReading | null {
    const read = figure(column, false)
    if (!read || of === null) return null
    return read.value > MOST[of] ? wrong(column, `“${text[column]}” is more than ${MOST[of].toLocaleString('en')} ${of}`) : { unit: of, value: read.value }
  }

  const massUnit = text.gross || text.net ? unitOf(text.unit, unit, told => wrong('unit', told)) : null
  if (text.serial === '') wrong('serial', 'No serial stands in this row')
  if (text.gross) put('theirGross', mass('gross', massUnit))
  if (text.net) put('acceptedNet', mass('net', massUnit))
  if (text.grade) {
    if (text.grade.length > LONGEST_GRADE || NOT_PRINTED.test(text.grade)) wrong('grade', `A grade has at most ${LONGEST_GRADE} letters that can be printed`)
    else figures.grade = text.grade
  }
  if (text.price) put('rate', rate())
  if (text.credit) put('statedCents', whole('credit', 100, MOST_CENTS))
  return { serial: text.serial, figures, problems }

  function rate(): LineFigures['rate'] {
    const mills = whole('price', 1000, MOST_MILLS)
    const per = unitOf(text.per, massUnit ?? unit, told => wrong('per', told))
    return mills === null || per === null ? null : { mills, per }
  }

  /** Cents or thousandths of an amount that has no more decimals than those. */
  function whole(column: 'price' | 'credit', parts: 100 | 1000, most: number): number | null {
    const read = figure(column, true)
    if (!read) return null
    if (read.decimals > Math.log10(parts)) return wrong(column, `“${text[column]}” has more than ${Math.log10(parts)} decimals`)
    const counted = Math.round(read.value * parts)
    return Math.abs(counted) > most ? wrong(column, `“${text[column]}” is too large an amount`) : counted
  }

  function put<K extends keyof RowFigures>(key: K, value: RowFigures[K] | null): void {
    if (value !== null) figures[key] = value
  }
}

function unitOf(text: string, usual: Unit | null, wrong: (told: string) => null): Unit | null {
  const name = text.toLowerCase().replace(/s$|\.$/, '')
  if (name === 'lb' || name === 'kg') return name
  if (name !== '') return wrong(`“${text}” is no unit of ours: lb or kg`)
  return usual ?? wrong('The unit is missing: lb or kg')
}

function textAt(cells: readonly string[], at: number | null): string {
  return at === null ? '' : (cells[at] ?? '').trim()
}
