import type { MassReading } from '../quantity/mass'

/** What somebody at a reclaimer's dock says of a shipment; the last of them takes an own entry out. */
export const DOCK_KINDS = ['here', 'gross', 'damaged', 'overdue', 'missing', 'unexpected', 'graded', 'sent-back', 'taken-out'] as const

export type DockKind = (typeof DOCK_KINDS)[number]

/** How many photos one entry names at most. Our choice. */
export const MOST_ENTRY_PHOTOS = 6

/** What an entry of each kind says; a kind of one line names its cylinder. */
export interface DockSaid {
  'here': { cylinderId: string }
  'gross': { cylinderId: string, gross: MassReading }
  'damaged': { cylinderId: string, what: string, photoIds: string[] }
  /** The retest date on it has passed. */
  'overdue': { cylinderId: string }
  'missing': { cylinderId: string }
  /** A cylinder that stands there and is not on the papers. */
  'unexpected': { serial: string, what: string | null, photoIds: string[] }
  'graded': { cylinderId: string, grade: string | null, acceptedNet: MassReading | null }
  'sent-back': { cylinderId: string, because: string | null }
  'taken-out': { entryId: string }
}

/** An entry as the phone makes it: its id, when it was made by the phone's clock, and the name typed there. */
export type DockEntry<Kind extends DockKind = DockKind> = {
  [Each in Kind]: { id: string, kind: Each, name: string, at: string, said: DockSaid[Each] }
}[Kind]

/** An entry and the link it came over, or will go over: nobody takes out what came over another. */
export type LinkedDockEntry<Kind extends DockKind = DockKind> = DockEntry<Kind> & { linkId: string }

/** Whether an entry is of a kind. */
export function isOfKind<Kind extends DockKind>(entry: LinkedDockEntry, kind: Kind): entry is Extract<LinkedDockEntry, { kind: Kind }> {
  return entry.kind === kind
}
