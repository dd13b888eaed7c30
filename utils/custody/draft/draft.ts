import type { MassReading, MassUnit } from '../../quantity/mass'
import type { Month } from '../../quantity/month'
import type { CylinderView } from '../cylinderView'
import type { EventKind } from '../kinds'
import type { DetailsOf } from '../schema'

/** A place as a form chooses it. */
export interface DraftPlace { id: string, name: string, kind: string, firmId: string | null, technicianId: string | null }

/** What a form begins from. */
export interface DraftContext {
  view: CylinderView
  unit: MassUnit
  /** Who is writing. */
  personId: string
  /** The present month in the firm's time zone. */
  thisMonth: Month
  places: readonly DraftPlace[]
  /** The refrigerant that the person came with. */
  asked: string | null
  /** The last gross in the log, as entered, where it still tells what is in the cylinder. */
  lastGross: MassReading | null
  /** The scale that was last used on this device; left out where none was, or it is out of use. */
  scaleId?: string
}

/** The details of an event as its form gives them, or what is still missing, in words. */
export type ReadDraft<K extends EventKind> = { details: DetailsOf<K>, placeId?: string } | { reason: string }

/** The form of one kind of event as plain data: how it begins, what it gives, and how a recorded event looks in it. */
export interface DraftKind<K extends EventKind, Draft> {
  empty(context: DraftContext): Draft
  read(draft: Draft, context: DraftContext): ReadDraft<K>
  /** `unit` is what the person reads scales in, for readings that are not kept in the unit they were typed in. */
  of(details: DetailsOf<K>, placeId: string | null, unit: MassUnit): Draft
}

/** A text that was typed, trimmed; undefined where nothing was. */
export function typedText(text: string): string | undefined {
  const trimmed = text.trim()
  return trimmed === '' ? undefined : trimmed
}
