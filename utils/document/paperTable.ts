import type { LabelText } from '../label/drawing'
import type { PaperRow } from './paper'
import { fittedLines, LINE_SPACING } from './wrappedText'

/** A column of a table: its head, and its share of the width beside those of the others. */
export interface TableColumn { head: string, share: number, align?: 'right', face?: 'words' | 'figures' }

/** Lines in columns under a head that each page repeats. `totals` stands below, with the last line. */
export interface PaperTable { kind: 'table', columns: readonly TableColumn[], rows: readonly (readonly string[])[], totals?: readonly string[] }

/** Where a table stands. Units: millimetres. */
interface Across { x: number, width: number }

interface Cell extends TableColumn { x: number, width: number }

const SIZE = 2.9
const PADDING = 0.9
const GUTTER = 1.6
const ASCENT = 0.85

/** A table as strips of a page: cells wrap between words, a line is never parted between pages. Units: millimetres. */
export function tableRows({ columns, rows, totals }: PaperTable, across: Across): PaperRow[] {
  const cells = cellsOf(columns, across)
  const head = { ...cellRow(columns.map(({ head }) => head), cells, across, { bold: true, thickness: 0.4 }), keepsNext: true }
  const lines = rows.map(row => ({ ...cellRow(row, cells, across, { bold: false, thickness: 0.12 }), repeats: head }))
  const last = lines.at(-1)
  if (!totals || !last) return [head, ...lines]
  const sums = { ...cellRow(totals, cells, across, { bold: true, thickness: 0.4 }), repeats: head }
  return [head, ...lines.slice(0, -1), { ...last, keepsNext: true }, sums]
}

function cellsOf(columns: readonly TableColumn[], { x, width }: Across): Cell[] {
  const shares = columns.reduce((sum, { share }) => sum + share, 0)
  const room = width - GUTTER * (columns.length - 1)
  return columns.map((column, index) => {
    const before = columns.slice(0, index).reduce((sum, { share }) => sum + share, 0)
    return { ...column, x: x + room * before / shares + GUTTER * index, width: room * column.share / shares }
  })
}

function cellRow(texts: readonly string[], cells: readonly Cell[], { x, width }: Across, { bold, thickness }: { bold: boolean, thickness: number }): PaperRow {
  const lines = cells.map((cell, index) => linesIn(texts[index] ?? '', cell.width))
  const most = Math.max(1, ...lines.map(({ length }) => length))
  const height = most * SIZE * LINE_SPACING + 2 * PADDING
  return {
    height,
    keepsNext: false,
    draw: y => ({
      texts: cells.flatMap((cell, index) => lines[index]!.map((text, line): LabelText => ({
        text, size: SIZE, y: y + PADDING + SIZE * (ASCENT + LINE_SPACING * line),
        face: `${cell.face ?? 'words'}${bold ? '-bold' : ''}` as LabelText['face'],
        x: cell.align === 'right' ? cell.x + cell.width : cell.x, align: cell.align ?? 'left', maxWidth: cell.width,
      }))),
      rules: [{ x, y: y + height - thickness, width, thickness }],
    }),
  }
}

function linesIn(text: string, width: number): string[] {
  return text === '' ? [] : fittedLines(text, { width, height: Infinity }, [SIZE]).lines
}
