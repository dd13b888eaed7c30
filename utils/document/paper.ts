import type { LabelDrawing, LabelRule, LabelText } from '../label/drawing'
import { tableRows, type PaperTable } from './paperTable'
import { fittedLines } from './wrappedText'

/** A part of a paper, from top to bottom. */
export type PaperBlock
  = | { kind: 'title' | 'heading' | 'item', text: string }
    /** `keepsNext`: stands on the page of the block after it. */
    | { kind: 'text', text: string, keepsNext?: boolean }
    | { kind: 'facts', rows: { term: string, value: string }[] }
    /** Lines to write on, each with what is to be written; all on one page. */
    | { kind: 'signatures', lines: string[] }
    | PaperTable

/** A paper as plain data: who sends it, what it says, and what each page repeats at its foot; `mark` stands large at the head of each. */
export interface Paper { sender: string[], blocks: PaperBlock[], foot: string, mark?: string }

/** US Letter, in millimetres. */
export const PAPER_MM = { width: 215.9, height: 279.4 } as const

const MARGIN = 20
const WIDTH = PAPER_MM.width - 2 * MARGIN
const FOOT_HEIGHT = 10
const BOTTOM = PAPER_MM.height - MARGIN - FOOT_HEIGHT
/** From one baseline to the next, over the size. */
const LEADING = 1.35
/** From the top of a row to its baseline, over the size. */
const ASCENT = 0.85
const SIZES = { title: 6.4, heading: 4.6, text: 3.9, item: 3.9, facts: 3.9, foot: 3.1 } as const
const GAP = 2.6
const TERM_WIDTH = 48
const INDENT = 5
const LINE_TO_WRITE_ON = 14
const MARK_SIZE = 7

/** A strip of a page that stays in one piece. Units: millimetres. */
export interface PaperRow {
  height: number
  /** Stands on the page of the row after it. */
  keepsNext: boolean
  /** Stands above it where it begins a page. */
  repeats?: PaperRow
  draw: (y: number) => { texts: LabelText[], rules?: LabelRule[] }
}

/**
 * The pages of a paper, each with its number and how many there are.
 *
 * Units: millimetres. A heading never stands last on a page, and no line is parted.
 */
export function paperPages({ sender, blocks, foot, mark }: Paper): LabelDrawing[] {
  const pages = paginated([...sender.map((text, index) => textRow(text, { size: SIZES.text, bold: index === 0 })), gap(GAP * 2), ...blocks.flatMap(rowsOf)])
  return pages.map((rows, index) => {
    const drawn = stacked(rows)
    const page = footOf(foot, `Page ${index + 1} of ${pages.length}`)
    return { ...PAPER_MM, qr: null, strokes: [], texts: [...markOf(mark), ...drawn.texts, ...page.texts], rules: [...drawn.rules, ...page.rules] }
  })
}

function rowsOf(block: PaperBlock): PaperRow[] {
  switch (block.kind) {
    case 'title': return [gap(GAP * 2, true), ...wrapped(block.text, { size: SIZES.title, bold: true }), gap(GAP)]
    case 'heading': return [gap(GAP, true), ...wrapped(block.text, { size: SIZES.heading, bold: true }).map(row => ({ ...row, keepsNext: true }))]
    case 'text': return [...wrapped(block.text, { size: SIZES.text }), gap(GAP)].map(row => ({ ...row, keepsNext: block.keepsNext ?? false }))
    case 'item': return [...wrapped(block.text, { size: SIZES.item, mark: '\u2013' }), gap(GAP / 2)]
    case 'facts': return [...block.rows.flatMap(factRows), gap(GAP)]
    case 'signatures': return [...block.lines.map((line, index) => signatureRow(line, index < block.lines.length - 1)), gap(GAP)]
    case 'table': return [...tableRows(block, { x: MARGIN, width: WIDTH }), gap(GAP)]
  }
}

interface Type { size: number, bold?: boolean, mark?: string }

function wrapped(text: string, type: Type): PaperRow[] {
  const indent = type.mark === undefined ? 0 : INDENT
  return linesOf(text, WIDTH - indent, type.size).map((line, index) => textRow(line, { ...type, mark: index === 0 ? type.mark : undefined }, indent))
}

function textRow(text: string, { size, bold, mark }: Type, indent = 0): PaperRow {
  const face = bold ? 'words-bold' as const : 'words' as const
  return {
    height: size * LEADING,
    keepsNext: false,
    draw: (y) => {
      const line = { face, size, y: y + size * ASCENT, align: 'left' as const }
      return { texts: [
        ...(mark === undefined ? [] : [{ ...line, text: mark, x: MARGIN, maxWidth: indent }]),
        { ...line, text, x: MARGIN + indent, maxWidth: WIDTH - indent },
      ] }
    },
  }
}

function factRows({ term, value }: { term: string, value: string }): PaperRow[] {
  const size = SIZES.facts
  return linesOf(value, WIDTH - TERM_WIDTH, size).map((line, index) => ({
    height: size * LEADING,
    keepsNext: false,
    draw: (y) => {
      const at = { size, y: y + size * ASCENT, align: 'left' as const }
      return { texts: [
        ...(index === 0 ? [{ ...at, text: term, face: 'words' as const, x: MARGIN, maxWidth: TERM_WIDTH - 2 }] : []),
        { ...at, text: line, face: 'words-bold' as const, x: MARGIN + TERM_WIDTH, maxWidth: WIDTH - TERM_WIDTH },
      ] }
    },
  }))
}

function signatureRow(text: string, keepsNext: boolean): PaperRow {
  return {
    height: LINE_TO_WRITE_ON,
    keepsNext,
    draw: (y) => {
      const baseline = y + LINE_TO_WRITE_ON - 2
      return {
        texts: [{ text, face: 'words', size: SIZES.text, x: MARGIN, y: baseline, align: 'left', maxWidth: TERM_WIDTH - 2 }],
        rules: [{ x: MARGIN + TERM_WIDTH, y: baseline, width: WIDTH - TERM_WIDTH, thickness: 0.25 }],
      }
    },
  }
}

function gap(height: number, keepsNext = false): PaperRow {
  return { height, keepsNext, draw: () => ({ texts: [] }) }
}

function linesOf(text: string, width: number, size: number): string[] {
  return text.split('\n').flatMap(line => fittedLines(line, { width, height: Infinity }, [size]).lines)
}

function paginated(rows: readonly PaperRow[]): PaperRow[][] {
  const pages: PaperRow[][] = [[]]
  let used = 0
  for (const piece of pieces(rows)) {
    const height = heightOf(piece)
    if (used > 0 && MARGIN + used + height > BOTTOM) {
      const repeated = piece[0]?.repeats
      pages.push(repeated ? [repeated] : [])
      used = repeated?.height ?? 0
    }
    pages.at(-1)!.push(...piece)
    used += height
  }
  return pages
}

/** Rows that stay together, from one that keeps the next to the first that does not. */
function pieces(rows: readonly PaperRow[]): PaperRow[][] {
  return rows.reduce<PaperRow[][]>((all, row) => {
    const last = all.at(-1)
    return last?.at(-1)?.keepsNext ? [...all.slice(0, -1), [...last, row]] : [...all, [row]]
  }, [])
}

function stacked(rows: readonly PaperRow[]): { texts: LabelText[], rules: LabelRule[] } {
  const drawn = rows.map((row, index) => row.draw(MARGIN + heightOf(rows.slice(0, index))))
  return { texts: drawn.flatMap(({ texts }) => texts), rules: drawn.flatMap(({ rules = [] }) => rules) }
}

function heightOf(rows: readonly PaperRow[]): number {
  return rows.reduce((sum, { height }) => sum + height, 0)
}

function markOf(mark: string | undefined): LabelText[] {
  if (mark === undefined) return []
  return [{ text: mark, face: 'words-bold', size: MARK_SIZE, x: MARGIN + WIDTH, y: MARGIN - GAP, align: 'right', maxWidth: WIDTH }]
}

function footOf(foot: string, number: string): { texts: LabelText[], rules: LabelRule[] } {
  const y = PAPER_MM.height - MARGIN
  const line = { face: 'words' as const, size: SIZES.foot, y }
  return {
    texts: [
      { ...line, text: foot, x: MARGIN, align: 'left', maxWidth: WIDTH - 30 },
      { ...line, text: number, x: MARGIN + WIDTH, align: 'right', maxWidth: 28 },
    ],
    rules: [{ x: MARGIN, y: y - FOOT_HEIGHT / 2, width: WIDTH, thickness: 0.25 }],
  }
}
