import { FULL_TEXT } from './arrangement'
import { formatLabelCode } from './code'
import { collarFrame, type LabelBox, type LabelDrawing, type LabelRule, type LabelText } from './drawing'
import { labelFacts, NOT_KNOWN, ownerLines, type IdentityLabelContent, type LabelFact } from './identityContent'

const { width: WIDTH } = FULL_TEXT

/** Characters of the firm's name that one line holds at a size to be read. */
const LONGEST_ON_ONE_LINE = 30

/** The two columns of facts; the second takes the wider ones: ten characters, as 'DOT-4BA400', at full size. */
const COLUMNS = [
  { left: 0, valueLeft: 5.4, right: 25.4 },
  { left: 26.4, valueLeft: 33.7, right: WIDTH },
] as const

/**
 * Everything that an identity label says, for a box of 57.2 x 50.8 mm or larger or smaller in proportion.
 *
 * Units: millimetres. At full size the capitals of the code are 5.9 mm high, for reading from 1 m away (capitals of
 * Roboto Mono measure 0.714 of its size).
 */
export function fullText(content: IdentityLabelContent, box: LabelBox): Pick<LabelDrawing, 'texts' | 'rules' | 'strokes'> {
  const scale = box.width / WIDTH
  const facts = placedFacts(content)
  const texts: LabelText[] = [
    ...ownerTexts(content.owner),
    { text: `${content.copy} of 2`, face: 'figures', size: 3.4, x: WIDTH, y: 7.4, align: 'right', maxWidth: 13 },
    { text: 'Telephone', face: 'words', size: 3.2, x: 0, y: 12.4, align: 'left', maxWidth: 16 },
    { text: content.telephone ?? NOT_KNOWN, face: 'figures', size: 3.4, x: 17, y: 12.4, align: 'left', maxWidth: WIDTH - 17 },
    { text: formatLabelCode(content.code), face: 'figures-bold', size: 8.2, x: 1.6, y: 23.5, align: 'left', maxWidth: WIDTH - 3.2 },
    ...facts.flatMap(factTexts),
    { text: 'Contents are on the contents tag', face: 'words-bold', size: 3.8, x: 0, y: 46.2, align: 'left', maxWidth: WIDTH },
  ]
  const rules: LabelRule[] = [{ x: 0, y: 41, width: WIDTH, thickness: 0.375 }, ...facts.flatMap(writingLines)]
  const frame = { x: box.x + 0.25 * scale, y: box.y + 15 * scale, width: (WIDTH - 0.5) * scale, height: 11 * scale }

  return {
    strokes: [{ path: collarFrame(frame, 3.2 * scale, 0.8 * scale), thickness: 0.5 * scale }],
    texts: texts.map(text => ({ ...text, size: text.size * scale, maxWidth: text.maxWidth * scale, ...placed(text) })),
    rules: rules.map(rule => ({ width: rule.width * scale, thickness: rule.thickness * scale, ...placed(rule) })),
  }

  function placed({ x, y }: { x: number, y: number }) {
    return { x: box.x + x * scale, y: box.y + y * scale }
  }
}

function ownerTexts(owner: string): LabelText[] {
  const line = { face: 'words-bold', x: 0, align: 'left', maxWidth: 43 } as const
  const [first, second] = ownerLines(owner, LONGEST_ON_ONE_LINE)
  if (second === undefined) return [{ ...line, text: first, size: 5, y: 7.4 }]
  return [{ ...line, text: first, size: 3.5, y: 5.7 }, { ...line, text: second, size: 3.5, y: 9.2 }]
}

type PlacedFact = LabelFact & { column: 0 | 1, y: number }

function placedFacts({ stamp }: IdentityLabelContent): PlacedFact[] {
  return labelFacts(stamp).map((fact, index) => ({ ...fact, column: index % 2 as 0 | 1, y: index < 2 ? 31.8 : 38 }))
}

function factTexts({ name, value, column, y }: PlacedFact): LabelText[] {
  const { left, valueLeft, right } = COLUMNS[column]
  const label: LabelText = { text: name, face: 'words', size: 3, x: left, y, align: 'left', maxWidth: valueLeft - left - 0.6 }
  if (value === null) return [label]
  return [label, { text: value, face: 'figures-bold', size: 3.9, x: valueLeft, y, align: 'left', maxWidth: right - valueLeft }]
}

function writingLines({ value, column, y }: PlacedFact): LabelRule[] {
  const { valueLeft, right } = COLUMNS[column]
  return value === null ? [{ x: valueLeft, y: y + 0.5, width: right - valueLeft, thickness: 0.25 }] : []
}
