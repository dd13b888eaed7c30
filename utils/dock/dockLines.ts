import type { MassReading } from '../quantity/mass'
import { isOfKind, type LinkedDockEntry } from './entry'
import { inOrder, standingEntries } from './standing'

/** What the dock says of one cylinder of a shipment, as its entries now stand together. */
export interface DockLine {
  here: boolean
  missing: boolean
  theirGross: MassReading | null
  /** The first weight that was read, where another stands now or none: with it our weight was shown. */
  firstGross: MassReading | null
  damage: string | null
  photoIds: string[]
  overdue: boolean
  grade: string | null
  acceptedNet: MassReading | null
  sentBack: { because: string | null } | null
  /** Of the newest entry that stands. */
  by: string
  at: string
}

/** A cylinder that stands at the dock and is not on the papers. */
export interface UnexpectedCylinder { entryId: string, serial: string, what: string | null, photoIds: string[], by: string, at: string }

/**
 * What the dock says of each cylinder, by its id; one of which nothing stands is left out. A later entry stands above an
 * earlier one of its kind; whoever weighs, grades or finds damaged has it there.
 */
export function dockLines(entries: readonly LinkedDockEntry[]): Map<string, DockLine> {
  const lines = new Map<string, DockLine>()
  for (const entry of standingEntries(entries)) {
    if (!('cylinderId' in entry.said)) continue
    const { cylinderId } = entry.said
    const before = lines.get(cylinderId) ?? EMPTY
    lines.set(cylinderId, { ...after(before, entry), by: entry.name, at: entry.at })
  }
  for (const [cylinderId, first] of firstReadings(entries)) {
    const line = lines.get(cylinderId)
    if (line && !isSame(first, line.theirGross)) line.firstGross = first
  }
  return lines
}

/** The cylinders at the dock that are not on the papers, in the order in which they were told. */
export function unexpectedCylinders(entries: readonly LinkedDockEntry[]): UnexpectedCylinder[] {
  return standingEntries(entries).filter(entry => isOfKind(entry, 'unexpected'))
    .map(({ id, name, at, said }) => ({ entryId: id, ...said, by: name, at }))
}

const EMPTY: DockLine = {
  here: false, missing: false, theirGross: null, firstGross: null, damage: null, photoIds: [], overdue: false,
  grade: null, acceptedNet: null, sentBack: null, by: '', at: '',
}

function after(before: DockLine, entry: LinkedDockEntry): DockLine {
  if (entry.kind === 'missing') return { ...before, here: false, missing: true }
  const line = { ...before, here: true, missing: false }
  switch (entry.kind) {
    case 'gross': return { ...line, theirGross: entry.said.gross }
    case 'damaged': return { ...line, damage: entry.said.what, photoIds: [...line.photoIds, ...entry.said.photoIds] }
    case 'overdue': return { ...line, overdue: true }
    case 'graded': return { ...line, grade: entry.said.grade ?? line.grade, acceptedNet: entry.said.acceptedNet ?? line.acceptedNet }
    case 'sent-back': return { ...line, sentBack: { because: entry.said.because } }
    default: return line
  }
}

/** The first weight read of each cylinder, also where it was taken out since. */
function firstReadings(entries: readonly LinkedDockEntry[]): Map<string, MassReading> {
  const first = new Map<string, MassReading>()
  for (const entry of inOrder(entries)) {
    if (isOfKind(entry, 'gross') && !first.has(entry.said.cylinderId)) first.set(entry.said.cylinderId, entry.said.gross)
  }
  return first
}

function isSame(a: MassReading, b: MassReading | null): boolean {
  return JSON.stringify(a) === JSON.stringify(b)
}
