import { labelCodeGroups } from './code'
import type { LabelBox, LabelDrawing, LabelRule, LabelText } from './drawing'
import { labelFacts, ownerLines, type IdentityLabelContent, type LabelFact } from './identityContent'

/** One piece of a row: its share of the width, and a line to write on where it has no text. */
interface Piece { text: string | null, face: LabelText['face'], share: number, align?: 'right' }

/** Pieces side by side; `weight` is the row's share of the height, `size` the most its type may have of the width. */
interface Row { weight: number, size: number, pieces: Piece[] }

/** Type fills so much of its row; the rest keeps rows apart. */
const TYPE_OF_ROW = 0.84
const BASELINE_OF_ROW = 0.74
const GAP = 0.8
/** Below it there is no room for the telephone number: whoever scans the label finds it. */
const TELEPHONE_FROM = 30
/** Characters of the firm's name that one line holds. */
const LONGEST_OWNER = 22
/** "1 of 2", as a share of the width, and at least so large. */
const COPY = { share: 0.06, least: 2.2 }

/**
 * What fits an identity label of medium size: without a telephone number where it is low, the code and the facts one
 * below the other where it is narrow for its height.
 *
 * Units: millimetres.
 */
export function mediumText(content: IdentityLabelContent, box: LabelBox): Pick<LabelDrawing, 'texts' | 'rules'> {
  const isTall = box.height > 0.9 * box.width
  const facts = labelFacts(content.stamp)
  const rows: Row[] = [
    ...ownerRows(content),
    ...codeRows(content.code, isTall ? 2 : 1),
    ...(isTall ? facts.map(fact => factRow([fact])) : [factRow(facts.slice(0, 2)), factRow(facts.slice(2))]),
    ...(box.height >= TELEPHONE_FROM && content.telephone !== null
      ? [{ weight: 1, size: 0.09, pieces: [{ text: content.telephone, face: 'figures' as const, share: 1 }] }]
      : []),
    { weight: 0.95, size: 0.1, pieces: [{ text: 'Contents are on the contents tag', face: 'words-bold', share: 1 }] },
  ]
  return placedRows(rows, box)
}

/** What is still legible on a small identity label: the code and the serial. */
export function smallText(content: IdentityLabelContent, box: LabelBox): Pick<LabelDrawing, 'texts' | 'rules'> {
  const [first, second] = codeLines(content.code, 2)
  const [serial] = labelFacts(content.stamp)
  return placedRows([
    codeRow([{ text: first!, face: 'figures-bold', share: 1 }]),
    codeRow([{ text: second!, face: 'figures-bold', share: 0.6 }, copyOf(content, 0.4)]),
    { weight: 1.4, size: 0.15, pieces: factPieces(serial, 1) },
  ], box)
}

function ownerRows(content: IdentityLabelContent): Row[] {
  const [first, second] = ownerLines(content.owner, LONGEST_OWNER)
  const head = (text: string, weight: number): Row => ({ weight, size: 0.1, pieces: [{ text, face: 'words-bold', share: 0.76 }, copyOf(content, 0.24)] })
  if (second === undefined) return [head(first, 1)]
  return [head(first, 0.7), { weight: 0.7, size: 0.1, pieces: [{ text: second, face: 'words-bold', share: 0.76 }] }]
}

function codeLines(code: string, lines: 1 | 2): string[] {
  const [first, second, third] = labelCodeGroups(code)
  return lines === 1 ? [`${first} ${second} ${third}`] : [`${first} ${second}`, third!]
}

function codeRows(code: string, lines: 1 | 2): Row[] {
  return codeLines(code, lines).map(text => codeRow([{ text, face: 'figures-bold', share: 1 }]))
}

/** The type is as large as seven or eleven characters of 0.6 allow: `maxWidth` sees to that. */
function codeRow(pieces: Piece[]): Row {
  return { weight: 1.7, size: 0.235, pieces }
}

function copyOf({ copy }: IdentityLabelContent, share: number): Piece {
  return { text: `${copy} of 2`, face: 'figures', share, align: 'right' }
}

function factRow(facts: LabelFact[]): Row {
  return { weight: 1.1, size: 0.088, pieces: facts.flatMap(fact => factPieces(fact, 1 / facts.length)) }
}

/** Of two columns the second takes the wider facts, as 'Spec' and 'DOT-4BA400'. */
function factPieces({ name, value }: LabelFact, share: number): Piece[] {
  const isFirst = name === 'SN' || name === 'TW'
  const half = share === 1 ? 1 : isFirst ? 0.45 : 0.55
  const named = share === 1 ? 0.2 : isFirst ? 0.11 : 0.17
  return [{ text: name, face: 'words', share: named }, { text: value, face: 'figures-bold', share: half - named }]
}

function placedRows(rows: Row[], box: LabelBox): Pick<LabelDrawing, 'texts' | 'rules'> {
  const texts: LabelText[] = []
  const rules: LabelRule[] = []
  const perWeight = box.height / rows.reduce((sum, { weight }) => sum + weight, 0)
  let top = box.y
  for (const { weight, size, pieces } of rows) {
    const height = weight * perWeight
    const y = top + height * BASELINE_OF_ROW
    let left = box.x
    for (const { text, face, share, align } of pieces) {
      const width = share * box.width
      const isLast = left + width > box.x + box.width - 1e-6
      const maxWidth = isLast ? width : width - GAP
      if (text === null) rules.push({ x: left, y: y + 0.4, width: maxWidth, thickness: 0.25 })
      else {
        texts.push({
          text, face, maxWidth, y, align: align ?? 'left',
          size: Math.min(height * TYPE_OF_ROW, align ? Math.max(COPY.share * box.width, COPY.least) : size * box.width),
          x: align ? left + maxWidth : left,
        })
      }
      left += width
    }
    top += height
  }
  return { texts, rules }
}
