import { formatLabelCode, labelCodeGroups } from '../label/code'
import type { LabelBox, LabelDrawing, LabelRule, LabelText } from '../label/drawing'
import { placedSymbol } from '../label/placedSymbol'
import { takesTag, type LabelStock } from '../label/stock'
import type { ContentsTag } from './contentsTag'
import { fittedLines, LINE_SPACING } from './wrappedText'

/** What is drawn: the tag, where its symbol leads, and the day of the fill as it is written. */
export interface DrawnTag { tag: ContentsTag, payload: string, day: string }

/** Capitals of Roboto Mono over its size. */
const CAPITALS = 0.714
/** The number is drawn a little above its least height, so that no rounding takes it below. */
const OVER_HEIGHT_MM = 0.1
const TALL_FROM = 100
const OUTLINE = 0.5
const EDGE = 2.3
const EYELET_RADIUS = 2.5
/** Where the symbol of a low tag begins, right of its eyelet. */
const LOW_LEFT = 9.4
const NAME_SIZES = [8, 7, 6, 5, 4.2, 3.5, 3, 2.6] as const

/**
 * The contents tag of one fill, with the outline to cut along and the place of its eyelet.
 *
 * Shape: on tall stock it hangs by its upper edge, on low stock by its left one. The identification number is as high
 * as 49 CFR 172.301(a)(1) asks for; the shipping name as large as there is room.
 * Units: millimetres.
 * Errors: RangeError for stock on which it does not fit.
 */
export function contentsTagDrawing({ tag, payload, day }: DrawnTag, stock: LabelStock, dotsPerInch: number): LabelDrawing {
  const { width, height } = stock.label
  if (!takesTag(stock)) throw new RangeError(`A contents tag does not fit ${stock.id}`)
  const isTall = height >= TALL_FROM
  const side = isTall ? 37.6 : 23.3
  const symbol = isTall ? { x: 5 + side / 2, y: height - 5 - side / 2 } : { x: LOW_LEFT + side / 2, y: height / 2 - 3 }
  const box = isTall
    ? { x: 7, y: 15, width: width - 14, height: height - 15 - side - 7 }
    : { x: LOW_LEFT + side + 0.5, y: 4, width: width - LOW_LEFT - side - 4.9, height: height - 8 }
  const { texts, rules } = tagText(tag, day, box)
  return {
    width, height,
    qr: placedSymbol(payload, { ...symbol, sideMm: side }, { dotsPerInch, diameterMm: null }),
    strokes: outline(width, height, isTall),
    texts: [...texts, ...(isTall ? codeBeside(tag.code, symbol, side, width) : codeBelow(tag.code, symbol, side))],
    rules,
  }
}

function tagText(tag: ContentsTag, day: string, box: LabelBox): { texts: LabelText[], rules: LabelRule[] } {
  const { x, width } = box
  const right = x + width
  const isLow = box.height < 60
  const line = { face: 'words-bold', x, align: 'left', maxWidth: width } as const
  const head = isLow ? 8 : 18
  const small = isLow ? 3.4 : 6
  const number = (tag.numberHeightMm + OVER_HEIGHT_MM) / CAPITALS
  const gap = isLow ? 1.2 : 3

  const headY = box.y + head * 0.75
  const kindY = isLow ? headY : headY + small * 1.3
  const ruleY = kindY + gap
  const numberY = ruleY + gap + number * CAPITALS
  const netY = box.y + box.height - small * 1.25
  const dayY = box.y + box.height - 0.2
  const nameTop = numberY + gap * 0.8
  const name = tag.entry.properShippingName ?? ''
  const { lines, size } = fittedLines(name, { width, height: netY - small - nameTop }, NAME_SIZES)

  const texts: LabelText[] = [
    { ...line, text: tag.refrigerant, face: 'figures-bold', size: head, y: headY, maxWidth: isLow && tag.kind ? width * 0.6 : width },
    ...(tag.kind ? [isLow ? { ...line, text: tag.kind, size: small * 1.1, x: right, y: kindY, align: 'right' as const, maxWidth: width * 0.38 } : { ...line, text: tag.kind, size: small * 1.1, y: kindY }] : []),
    { ...line, text: tag.entry.un ?? 'UN', face: 'figures-bold', size: number, y: numberY },
    ...lines.map((text, index) => ({ ...line, text, size, y: nameTop + size * (0.8 + LINE_SPACING * index) })),
    { ...line, text: tag.net === null ? 'Net, not weighed:' : `Net ${tag.net}`, face: 'figures-bold', size: small, y: netY },
    { ...line, text: `${day}  ${tag.technician}`, face: 'words', size: small, y: dayY },
  ]
  const rules: LabelRule[] = [
    { x, y: ruleY, width, thickness: 0.375 },
    // Who ships it writes number and name on these.
    ...(tag.entry.un ? [] : [{ x: x + number * 1.3, y: numberY, width: width - number * 1.3, thickness: 0.25 }, { x, y: netY - small - 1.5, width, thickness: 0.25 }]),
    ...(tag.net === null ? [{ x: x + small * 11, y: netY + 0.4, width: width - small * 11, thickness: 0.25 }] : []),
  ]
  return { texts, rules }
}

function codeBeside(code: string, { x, y }: { x: number, y: number }, side: number, width: number): LabelText[] {
  const left = x + side / 2 + 1
  return labelCodeGroups(code).map((text, index) => ({
    text, face: 'figures-bold', size: 11, x: left, y: y - 7 + index * 11, align: 'left', maxWidth: width - left - 6,
  }))
}

function codeBelow(code: string, { x, y }: { x: number, y: number }, side: number): LabelText[] {
  return [{ text: formatLabelCode(code), face: 'figures-bold', size: 3.6, x: x - side / 2 - 1, y: y + side / 2 + 3.4, align: 'left', maxWidth: side + 0.6 }]
}

/** The tag's edge with two corners cut, and its eyelet between them. */
function outline(width: number, height: number, isTall: boolean): LabelDrawing['strokes'] {
  const [left, top, right, bottom] = [EDGE, EDGE, width - EDGE, height - EDGE]
  const cut = isTall ? 11 : 8
  const path = isTall
    ? `M${left + cut} ${top}L${right - cut} ${top}L${right} ${top + cut}L${right} ${bottom}L${left} ${bottom}L${left} ${top + cut}Z`
    : `M${left + cut} ${top}L${right} ${top}L${right} ${bottom}L${left + cut} ${bottom}L${left} ${bottom - cut}L${left} ${top + cut}Z`
  const eyelet = isTall ? { x: width / 2, y: top + 6 } : { x: left + 4.2, y: height / 2 }
  return [{ path, thickness: OUTLINE }, { path: circle(eyelet.x, eyelet.y), thickness: OUTLINE }]
}

/** Eight curves, whose corners lie on the tangents: round to a hundredth of its radius. */
function circle(x: number, y: number): string {
  const at = (radius: number, eighths: number) => `${x + radius * Math.cos(eighths * Math.PI / 4)} ${y + radius * Math.sin(eighths * Math.PI / 4)}`
  const corner = EYELET_RADIUS / Math.cos(Math.PI / 8)
  return `M${at(EYELET_RADIUS, 0)}${Array.from({ length: 8 }, (_, index) => `Q${at(corner, index + 0.5)} ${at(EYELET_RADIUS, index + 1)}`).join('')}Z`
}
