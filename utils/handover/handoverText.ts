import { isLabelCode, LABEL_SYMBOLS } from '../label/code'

/** What one phone offers to another: these cylinders, by this person, at this minute. */
export interface HandoverOffer {
  is: 'offer'
  /** Eight symbols of chance, so that an answer finds its offer. */
  id: string
  personId: string
  /** Units: UTC milliseconds, on the whole minute. */
  atMs: number
  /** By label code, or by id where they have no label. */
  cylinders: string[]
}

/** What the other phone answers: of that offer this person has taken these. */
export interface HandoverAnswer extends Omit<HandoverOffer, 'is'> { is: 'answer' }

export type Handover = HandoverOffer | HandoverAnswer

/** What a text holds, or why it cannot be used: it is of a newer version of the application, or was not read whole. */
export type ReadHandover = { handover: Handover } | { reason: 'newer' | 'broken' }

/** Most cylinders in one symbol, so that a phone still reads it off a phone. */
export const MOST_HANDED_OVER = 20
/** How many symbols the id of an offer has. */
export const OFFER_ID_LENGTH = 8

const NAME = 'CYLINDERS'
const VERSION = 1
const LETTERS = { offer: 'O', answer: 'A' } as const
const MS_PER_MINUTE = 60_000
const BASE = 36
const LARGEST_SUM = 97

/**
 * A handover as the text of a symbol, all in capitals so that the symbol stays small.
 *
 * Shape: name and version, which of the two, id, person, minute, cylinders, check, between strokes.
 *
 * @example 'CYLINDERS1/O/7K3M9Q2T/01900000000070008000000000000001/HFJ2A8/7K3M9Q2TX.4P8W1Z6QC/42'
 */
export function handoverText({ is, id, personId, atMs, cylinders }: Handover): string {
  const body = [
    `${NAME}${VERSION}`, LETTERS[is], id, shortId(personId), Math.floor(atMs / MS_PER_MINUTE).toString(BASE).toUpperCase(),
    cylinders.map(cylinder => isLabelCode(cylinder) ? cylinder : shortId(cylinder)).join('.'),
  ].join('/')
  return `${body}/${checkOf(body)}`
}

/** What a scanned text hands over; null where it is something else, such as a label. */
export function readHandover(text: string): ReadHandover | null {
  const typed = text.trim().toUpperCase()
  const version = new RegExp(`^${NAME}(\\d+)/`).exec(typed)?.[1]
  if (version === undefined) return null
  if (Number(version) !== VERSION) return { reason: 'newer' }
  const [, body = '', check] = /^(.*)\/(\d{2})$/.exec(typed) ?? []
  const [, letter, id = '', person = '', minute = '', list = '', ...more] = body.split('/')
  const is = letter === LETTERS.offer ? 'offer' : letter === LETTERS.answer ? 'answer' : null
  const personId = longId(person)
  const cylinders = (list === '' ? [] : list.split('.')).map(part => isLabelCode(part) ? part : longId(part))
  const isSound = check === checkOf(body) && is !== null && more.length === 0 && isOfferId(id) && personId !== null && /^[0-9A-Z]{1,8}$/.test(minute)
    && cylinders.length <= MOST_HANDED_OVER && (is === 'answer' || cylinders.length > 0) && !cylinders.includes(null)
  if (!isSound) return { reason: 'broken' }
  return { handover: { is, id, personId, atMs: Number.parseInt(minute, BASE) * MS_PER_MINUTE, cylinders: cylinders as string[] } }
}

/** An id for an offer, from as many bytes of chance as it has symbols. */
export function offerId(bytes: Uint8Array): string {
  return Array.from(bytes.slice(0, OFFER_ID_LENGTH), byte => LABEL_SYMBOLS.charAt(byte & 31)).join('')
}

function isOfferId(id: string): boolean {
  return id.length === OFFER_ID_LENGTH && [...id].every(symbol => LABEL_SYMBOLS.includes(symbol))
}

function shortId(uuid: string): string {
  return uuid.replaceAll('-', '').toUpperCase()
}

function longId(hex: string): string | null {
  return /^[0-9A-F]{32}$/.test(hex) ? hex.toLowerCase().replace(/^(.{8})(.{4})(.{4})(.{4})(.{12})$/, '$1-$2-$3-$4-$5') : null
}

// Weighs each character by its place: a lost, changed or exchanged one gives another sum.
function checkOf(body: string): string {
  let sum = 0
  for (const character of body) sum = (sum * 3 + character.charCodeAt(0)) % LARGEST_SUM
  return String(sum).padStart(2, '0')
}
