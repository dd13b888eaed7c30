import type { Condition, CylinderRow } from '../custody/cylinderView'
import { CONDITION_WORDS } from '../custody/words'
import { formatMass, type MassUnit } from '../quantity/mass'

/** What the cylinders aboard still take of what each holds. */
export interface RoomAboard {
  /** One for each refrigerant in each condition, the most room first. */
  sums: RoomSum[]
  /** Takes what goes in first; how much depends on it. */
  empty: number
  /** Holds nobody knows what. */
  unknown: number
  /** May not be filled: under a stop, or late for the retest. */
  barred: number
}

/** Room for one refrigerant. Units: grams; null where no room is known. */
export interface RoomSum { refrigerant: string, condition: Condition, roomGrams: number | null, withRoom: number, notKnown: number }

type Row = Pick<CylinderRow, 'refrigerant' | 'condition' | 'nothingInIt' | 'roomGrams' | 'worstFinding' | 'findingCodes'>

/** Adds up the room aboard by what it is for: one refrigerant to a cylinder, and burnt not onto clean. What is not known is counted, never taken as nothing. */
export function roomAboard(rows: readonly Row[]): RoomAboard {
  const barred = rows.filter(isBarred)
  const open = rows.filter(row => !isBarred(row))
  const empty = open.filter(row => row.nothingInIt)
  const held = open.filter(row => !row.nothingInIt && row.refrigerant !== null)
  const kinds = new Map(held.map(row => [`${row.refrigerant} ${row.condition}`, row]))
  const sums = [...kinds.values()].map(({ refrigerant, condition }) => {
    const alike = held.filter(row => row.refrigerant === refrigerant && row.condition === condition)
    const known = alike.flatMap(({ roomGrams }) => roomGrams === null ? [] : [roomGrams])
    return {
      refrigerant: refrigerant!, condition, withRoom: known.length, notKnown: alike.length - known.length,
      // Too much in one is no less room in another.
      roomGrams: known.length === 0 ? null : known.reduce((sum, grams) => sum + Math.max(0, grams), 0),
    }
  }).sort((a, b) => (b.roomGrams ?? -1) - (a.roomGrams ?? -1) || a.refrigerant.localeCompare(b.refrigerant))
  return { sums, empty: empty.length, unknown: open.length - empty.length - held.length, barred: barred.length }
}

/** The same as rows of a list. Rounding: room goes down. */
export function roomInWords({ sums, empty, unknown, barred }: RoomAboard, unit: MassUnit): { term: string, value: string | null, reason?: string, figure?: boolean }[] {
  const cylinders = (count: number) => count === 1 ? '1 cylinder' : `${count} cylinders`
  return [
    ...sums.map(({ refrigerant, condition, roomGrams, withRoom, notKnown }) => ({
      term: [
        condition === 'clean' ? refrigerant : `${refrigerant}, ${CONDITION_WORDS[condition]}`,
        withRoom > 0 && `in ${cylinders(withRoom)}`,
        withRoom > 0 && notKnown > 0 && `${notKnown} more not known`,
      ].filter(Boolean).join(', '),
      value: roomGrams === null ? null : formatMass(roomGrams, unit, 'down'),
      reason: `not known of ${cylinders(notKnown)}`,
      figure: true,
    })),
    ...empty > 0 ? [{ term: `Nothing in ${cylinders(empty)}`, value: 'by what goes in first' }] : [],
    ...unknown > 0 ? [{ term: `Unknown contents in ${cylinders(unknown)}`, value: null }] : [],
    ...barred > 0 ? [{ term: `${cylinders(barred)} not to be filled`, value: 'no room' }] : [],
  ]
}

function isBarred({ worstFinding, findingCodes }: Row): boolean {
  return worstFinding?.severity === 'stop' || findingCodes.includes('retest-overdue')
}
