import { parseFigure, parseSignedFigure } from '../quantity/figure'
import type { MassReading } from '../quantity/mass'
import type { Rate } from '../reclaim/price'
import type { LineFigures, LineOutcome } from './figures'

/** The boxes of a line, as they stand on the screen. */
export interface TypedLine { gross: string, net: string, grade: string, price: string, stated: string, outcome: LineOutcome | '' }

/** The boxes in the order in which they stand, and in which a pasted row fills them. */
export const TYPED_COLUMNS = ['gross', 'net', 'grade', 'price', 'stated'] as const
export type TypedColumn = (typeof TYPED_COLUMNS)[number]

/** What was typed: the line's figures, or what is wrong by box. */
export type ReadTyped = { figures: LineFigures } | { wrong: Partial<Record<TypedColumn, string>> }

/** A value, or why there is none. */
export type Typed<T> = { value: T | null } | { wrong: string }

type Unit = 'lb' | 'kg'

const MASS = /^(.*?)\s*(lb|kg)?$/i
const POUNDS_AND_OUNCES = /^(\d+)\s*lb\s*(\d+(?:\.\d+)?)\s*oz$/i
const RATE = /^(.*?)\s*(?:(?:\/|per|a)\s*(lb|kg))?$/i
const MOST = { lb: 100_000, kg: 45_000 }
const LONGEST_GRADE = 80

/** A line's figures as its boxes show them; what has another unit than the screen's says so. */
export function typedOf({ theirGross, acceptedNet, grade, rate, statedCents, outcome }: LineFigures, unit: Unit): TypedLine {
  return {
    gross: massText(theirGross, unit),
    net: massText(acceptedNet, unit),
    grade: grade ?? '',
    price: rateText(rate, unit),
    stated: moneyText(statedCents),
    outcome: outcome ?? '',
  }
}

/** Reads the boxes of a line. Errors: each box that holds no figure, with the reason; an empty box is nothing said and never 0. */
export function readTyped(typed: TypedLine, unit: Unit): ReadTyped {
  const [gross, net, price, stated] = [readMass(typed.gross, unit), readMass(typed.net, unit), readRate(typed.price, unit), readMoney(typed.stated)]
  const grade = typed.grade.trim()
  const wrong = {
    ...'wrong' in gross && { gross: gross.wrong },
    ...'wrong' in net && { net: net.wrong },
    ...grade.length > LONGEST_GRADE && { grade: `At most ${LONGEST_GRADE} letters.` },
    ...'wrong' in price && { price: price.wrong },
    ...'wrong' in stated && { stated: stated.wrong },
  }
  if ('wrong' in gross || 'wrong' in net || 'wrong' in price || 'wrong' in stated || grade.length > LONGEST_GRADE) return { wrong }
  return {
    figures: {
      theirGross: gross.value, acceptedNet: net.value, grade: grade === '' ? null : grade, rate: price.value, statedCents: stated.value,
      outcome: typed.outcome === '' ? null : typed.outcome,
    },
  }
}

/** What was typed for one unit of the screen, as it says the same under another; what cannot be read stays as it is. */
export function retyped(typed: TypedLine, from: Unit, to: Unit): TypedLine {
  if (from === to) return typed
  const [gross, net, price] = [readMass(typed.gross, from), readMass(typed.net, from), readRate(typed.price, from)]
  return {
    ...typed,
    gross: 'wrong' in gross ? typed.gross : massText(gross.value, to),
    net: 'wrong' in net ? typed.net : massText(net.value, to),
    price: 'wrong' in price ? typed.price : rateText(price.value, to),
  }
}

/** A weight, in the screen's unit unless it says another. @example readMass('41 lb 13 oz', 'kg') // { value: { unit: 'lb-oz', lb: 41, oz: 13 } } */
export function readMass(text: string, unit: Unit): Typed<MassReading> {
  const typed = text.trim()
  if (typed === '') return { value: null }
  const pair = POUNDS_AND_OUNCES.exec(typed)
  if (pair) {
    const [lb, oz] = [Number(pair[1]), Number(pair[2])]
    return oz < 16 && lb <= MOST.lb ? { value: { unit: 'lb-oz', lb, oz } } : { wrong: 'Ounces go from 0 to less than 16.' }
  }
  const [, figure, named] = MASS.exec(typed)!
  const of = (named?.toLowerCase() ?? unit) as Unit
  const read = parseFigure(figure!)
  if ('error' in read) return { wrong: notRead(typed, read.error, 'weight', '62.3') }
  return read.value > MOST[of] ? { wrong: `At most ${MOST[of].toLocaleString('en')} ${of}.` } : { value: { unit: of, value: read.value } }
}

/** A price for the screen's unit unless it names another; below zero where it is charged. @example readRate('-1.50/kg', 'lb') // { value: { mills: -1500, per: 'kg' } } */
export function readRate(text: string, unit: Unit): Typed<Rate> {
  const typed = text.trim()
  if (typed === '') return { value: null }
  const [, figure, named] = RATE.exec(typed)!
  const mills = parts(figure!, 3)
  return 'wrong' in mills ? mills : { value: { mills: mills.value, per: (named?.toLowerCase() ?? unit) as Unit } }
}

/** An amount in cents; below zero where it is charged. */
export function readMoney(text: string): Typed<number> {
  return text.trim() === '' ? { value: null } : parts(text.trim(), 2)
}

/** A pasted block as rows of cells: columns are parted by tabs, as a spreadsheet copies them. */
export function pastedBlock(text: string): string[][] {
  return text.replace(/\r?\n$/, '').split(/\r?\n/).map(row => row.split('\t').map(cell => cell.trim()))
}

/** An amount as a box shows it. */
export function moneyText(cents: number | null): string {
  return cents === null ? '' : (cents / 100).toFixed(2)
}

function parts(text: string, decimals: 2 | 3): { value: number } | { wrong: string } {
  const plain = text.replace('$', '').trim()
  const read = parseSignedFigure(plain)
  if ('error' in read) return { wrong: notRead(text, read.error, 'amount', '-2.40') }
  if ((plain.split(/[.,]/)[1]?.length ?? 0) > decimals) return { wrong: `At most ${decimals} decimals.` }
  return { value: Math.round(read.value * 10 ** decimals) }
}

function notRead(text: string, error: 'empty' | 'not-a-number' | 'ambiguous', what: string, example: string): string {
  return error === 'ambiguous' ? `“${text}” can be read in two ways.` : `“${text}” is no ${what}, such as ${example}.`
}

function massText(reading: MassReading | null, unit: Unit): string {
  if (reading === null) return ''
  if (reading.unit === 'lb-oz') return `${reading.lb} lb ${reading.oz} oz`
  return reading.unit === unit ? String(reading.value) : `${reading.value} ${reading.unit}`
}

function rateText(rate: Rate | null, unit: Unit): string {
  if (rate === null) return ''
  const figure = (rate.mills / 1000).toFixed(rate.mills % 10 === 0 ? 2 : 3)
  return rate.per === unit ? figure : `${figure}/${rate.per}`
}
