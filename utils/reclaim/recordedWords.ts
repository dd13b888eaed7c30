import { formatWholeDay, type Day } from '../quantity/day'
import { standings, type RowStanding } from './dated'

/** A row as it was recorded (ISO 8601) and perhaps taken back. */
export interface Recorded { id: string, fromDay: Day, recordedAt: string, withdrawn: object | null }

/** How each row stands on a day, by its id. */
export function rowStandings(rows: readonly Recorded[], today: Day): Map<string, RowStanding> {
  return standings(rows.map(({ id, fromDay, recordedAt, withdrawn }) => ({ id, fromDay, recordedAt: Date.parse(recordedAt), isWithdrawn: withdrawn !== null })), today)
}

/** How a row stands, as a shape and a word. */
export function standingWords(standing: RowStanding): { kind: 'ok' | 'att' | 'unk' | 'away', text: string } {
  switch (standing.is) {
    case 'in-force': return { kind: 'ok', text: 'holds' }
    case 'to-come': return { kind: 'att', text: 'to come' }
    case 'replaced': return { kind: 'unk', text: 'replaced before it held' }
    case 'withdrawn': return { kind: 'unk', text: 'taken back' }
    case 'ended': return { kind: 'away', text: `until ${formatWholeDay(standing.untilDay)}` }
  }
}

/** By whom and when a row was recorded, and taken back. */
export function recordedWords({ recordedBy, recordedOn, withdrawn }: { recordedBy: { name: string }, recordedOn: Day, withdrawn: { by: { name: string }, on: Day } | null }): string {
  const by = `${recordedBy.name}, ${formatWholeDay(recordedOn)}`
  return withdrawn ? `${by}; taken back by ${withdrawn.by.name}, ${formatWholeDay(withdrawn.on)}` : by
}
