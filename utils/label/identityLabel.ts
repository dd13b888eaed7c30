import { formatLabelCode } from './code'
import { QUIET_MODULES, labelSymbol, symbolPath, type LabelSymbol } from './symbol'
import { dotMm, type LabelStock } from './stock'

/** What is printed where a fact is not known. */
export const NOT_KNOWN = '–'

/** The four faces of a label: figures and codes in Roboto Mono, words in Barlow. */
export type LabelFace = 'figures' | 'figures-bold' | 'words' | 'words-bold'

/** One run of text; `y` is its baseline. It is set smaller where it would be wider than `maxWidth`, never cut. */
export interface LabelText {
  text: string
  face: LabelFace
  size: number
  x: number
  y: number
  align: 'left' | 'right'
  maxWidth: number
}

/** A filled bar: a dividing line, or the line to write on. */
export interface LabelRule {
  x: number
  y: number
  width: number
  thickness: number
}

/** The outline around the code, its upper corners rounder than its lower ones. */
export interface LabelFrame {
  x: number
  y: number
  width: number
  height: number
  thickness: number
  upperRadius: number
  lowerRadius: number
}

/** The symbol: `x`, `y` is the corner of its dark part, `path` its outline in modules. */
export interface LabelQr {
  payload: string
  version: number
  level: LabelSymbol['level']
  modules: number
  moduleMm: number
  x: number
  y: number
  path: string
}

/** One label as plain data, all lengths in millimetres from its top left corner. */
export interface IdentityLabel {
  code: string
  width: number
  height: number
  qr: LabelQr
  frame: LabelFrame
  texts: LabelText[]
  rules: LabelRule[]
}

/** What of the collar stamp stands on the label, as entered; null is not known. */
export interface LabelledStamp {
  serial: string | null
  /** As 'DOT-4BA'. */
  spec: string | null
  servicePressurePsig: number | null
  /** With its unit, as '27.9 lb'. */
  tareWeight: string | null
  waterCapacity: string | null
}

/** What an identity label says. Without a stamp it is a blank one, bound to a cylinder later. */
export interface IdentityLabelContent {
  code: string
  payload: string
  owner: string
  telephone: string | null
  copy: 1 | 2
  stamp: LabelledStamp | null
}

/** The usual module; a symbol too large for its place gets smaller ones. */
const MODULE_MM = 1

/** The place of the symbol with its quiet zone: 37 modules of 1.016 mm, the nearest that 300 and 600 dpi printers can draw. */
const SYMBOL_PLACE_MM = 37.6

const SYMBOL_LEFT = 2.4
const LEFT = 42
const RIGHT = 99.2
const WIDTH = RIGHT - LEFT

/** Characters of the firm's name that one line holds at a size to be read. */
const LONGEST_ON_ONE_LINE = 30

/** The two columns of facts; the second takes the wider ones: ten characters, as 'DOT-4BA400', at full size. */
const COLUMNS = [
  { left: LEFT, valueLeft: LEFT + 5.4, right: 67.4 },
  { left: 68.4, valueLeft: 75.7, right: RIGHT },
] as const

/**
 * The permanent label of one cylinder: whose it is and what its collar says, nothing of what is in it.
 *
 * A marking of contents would have to come off when they change (49 CFR 172.303(a)); it belongs on the contents tag.
 *
 * Shape: for stocks of 101.6 x 50.8 mm. Units: millimetres. Capitals of the code are 5.9 mm high, for reading from
 * 1 m away (capitals of Roboto Mono measure 0.714 of its size).
 * Errors: RangeError for a label of another size.
 */
export function identityLabel(content: IdentityLabelContent, stock: LabelStock): IdentityLabel {
  const { width, height } = stock.label
  if (width !== 101.6 || height !== 50.8) {
    throw new RangeError(`The identity label is drawn for 101.6 x 50.8 mm, not ${width} x ${height}`)
  }
  const { stamp } = content
  const facts = [
    { name: 'SN', value: stamp?.serial, column: 0, y: 31.8 },
    { name: 'Spec', value: stamp && specMark(stamp), column: 1, y: 31.8 },
    { name: 'TW', value: stamp?.tareWeight, column: 0, y: 38 },
    { name: 'WC', value: stamp?.waterCapacity, column: 1, y: 38 },
  ] as const

  return {
    code: content.code,
    width,
    height,
    qr: placedSymbol(content.payload, stock),
    frame: { x: LEFT + 0.25, y: 15, width: WIDTH - 0.5, height: 11, thickness: 0.5, upperRadius: 3.2, lowerRadius: 0.8 },
    texts: [
      ...ownerTexts(content.owner),
      { text: `${content.copy} of 2`, face: 'figures', size: 3.4, x: RIGHT, y: 7.4, align: 'right', maxWidth: 13 },
      { text: 'Telephone', face: 'words', size: 3.2, x: LEFT, y: 12.4, align: 'left', maxWidth: 16 },
      { text: content.telephone ?? NOT_KNOWN, face: 'figures', size: 3.4, x: LEFT + 17, y: 12.4, align: 'left', maxWidth: WIDTH - 17 },
      { text: formatLabelCode(content.code), face: 'figures-bold', size: 8.2, x: LEFT + 1.6, y: 23.5, align: 'left', maxWidth: WIDTH - 3.2 },
      ...facts.flatMap(fact => factTexts(fact, stamp !== null)),
      { text: 'Contents are on the contents tag', face: 'words-bold', size: 3.8, x: LEFT, y: 46.2, align: 'left', maxWidth: WIDTH },
    ],
    rules: [
      { x: LEFT, y: 41, width: WIDTH, thickness: 0.375 },
      ...(stamp === null ? facts.map(writingLine) : []),
    ],
  }
}

/** A long name stands on two lines, broken between words near its middle: on one it would be too small to read. */
function ownerTexts(owner: string): LabelText[] {
  const line = { face: 'words-bold', x: LEFT, align: 'left', maxWidth: 43 } as const
  const gaps = [...owner].flatMap((sign, at) => sign === ' ' ? [at] : [])
  if (owner.length <= LONGEST_ON_ONE_LINE || gaps.length === 0) return [{ ...line, text: owner, size: 5, y: 7.4 }]
  const middle = owner.length / 2
  const at = gaps.reduce((best, gap) => Math.abs(gap - middle) < Math.abs(best - middle) ? gap : best)
  return [
    { ...line, text: owner.slice(0, at), size: 3.5, y: 5.7 },
    { ...line, text: owner.slice(at + 1), size: 3.5, y: 9.2 },
  ]
}

interface Fact {
  name: string
  value: string | null | undefined
  column: 0 | 1
  y: number
}

function factTexts({ name, value, column, y }: Fact, isStamped: boolean): LabelText[] {
  const { left, valueLeft, right } = COLUMNS[column]
  const label: LabelText = { text: name, face: 'words', size: 3, x: left, y, align: 'left', maxWidth: valueLeft - left - 0.6 }
  if (!isStamped) return [label]
  return [label, {
    text: value ?? NOT_KNOWN,
    face: 'figures-bold', size: 3.9, x: valueLeft, y, align: 'left', maxWidth: right - valueLeft,
  }]
}

function writingLine({ column, y }: Fact): LabelRule {
  const { valueLeft, right } = COLUMNS[column]
  return { x: valueLeft, y: y + 0.5, width: right - valueLeft, thickness: 0.25 }
}

/** Specification and service pressure as one mark, as on the collar; apart where the digits would run together. */
function specMark({ spec, servicePressurePsig }: LabelledStamp): string | null {
  if (spec === null && servicePressurePsig === null) return null
  const pressure = servicePressurePsig === null ? NOT_KNOWN : String(servicePressurePsig)
  const runsTogether = spec !== null && servicePressurePsig !== null && /\D$/.test(spec)
  return `${spec ?? NOT_KNOWN}${runsTogether ? '' : ' '}${pressure}`
}

/** The symbol centred in its place, its modules a whole number of the printer's dots. */
function placedSymbol(payload: string, stock: LabelStock): LabelQr {
  const symbol = labelSymbol(payload)
  const dot = dotMm(stock)
  const modulesAcross = symbol.size + 2 * QUIET_MODULES
  const dots = Math.min(Math.round(MODULE_MM / dot), Math.floor(SYMBOL_PLACE_MM / modulesAcross / dot))
  const moduleMm = dots * dot
  const side = symbol.size * moduleMm
  return {
    payload,
    version: symbol.version,
    level: symbol.level,
    modules: symbol.size,
    moduleMm,
    x: SYMBOL_LEFT + (SYMBOL_PLACE_MM - side) / 2,
    y: (stock.label.height - side) / 2,
    path: symbolPath(symbol),
  }
}
