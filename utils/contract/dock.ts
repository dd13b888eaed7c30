import { z } from 'zod'
import { MOST_ENTRY_PHOTOS, type DockEntry, type LinkedDockEntry } from '../dock/entry'
import { LINK_DAYS, USUAL_LINK_DAYS } from '../dock/linkDays'
import type { MassReading, MassUnit } from '../quantity/mass'
import type { MailOutcome } from './people'
import type { ProblemDetails } from './problem'
import { eachOnce, grossReading, id, line, massReading } from './parts'
import type { ShipmentState } from './shipments'
import { uploadForm } from './uploads'

/** POST /api/shipments/{id}/dock-links: a link for the reclaimer's dock; mailed where an address is given. */
export const dockLinkBody = z.strictObject({
  id,
  forWhom: line(80),
  days: z.literal(LINK_DAYS, `must be one of ${LINK_DAYS.join(', ')}`).default(USUAL_LINK_DAYS),
  email: z.email('must be an email address').max(254).optional(),
})
export type NewDockLink = z.output<typeof dockLinkBody>

/** The path of one link of a shipment. */
export const dockLinkParams = z.strictObject({ id, link: id })

/** A link to a shipment as our people see it; what opens is not among it. */
export interface DockLink {
  id: string
  forWhom: string
  createdAt: string
  createdBy: string | null
  expiresAt: string
  revokedAt: string | null
  revokedBy: string | null
  state: 'open' | 'expired' | 'revoked'
  firstUsedAt: string | null
  /** When the last entry came over it; null where none has. */
  lastEntryAt: string | null
  entries: number
}
/** GET /api/shipments/{id}/dock-links: the newest first. */
export interface DockLinksAnswer { items: DockLink[] }
/** What POST answers: the one time that the address is told. */
export interface NewDockLinkAnswer { link: DockLink, url: string, mail: MailOutcome | null }

/** Of the paths below a dock link; whether it is one is looked at before anything else. */
export const dockParams = z.strictObject({ token: z.string() })
export const dockShipmentParams = z.strictObject({ token: z.string(), id })
export const dockPhotoParams = z.strictObject({ token: z.string(), id })

const photoIds = z.array(id).max(MOST_ENTRY_PHOTOS).refine(ids => eachOnce(ids), 'must name each photo once').default([])
const cylinderId = id
const made = { id, name: line(80), at: z.iso.datetime({ offset: true, error: 'must be an instant with its offset' }) }

const dockEntry = z.discriminatedUnion('kind', [
  z.strictObject({ ...made, kind: z.literal('here'), said: z.strictObject({ cylinderId }) }),
  z.strictObject({ ...made, kind: z.literal('gross'), said: z.strictObject({ cylinderId, gross: grossReading }) }),
  z.strictObject({ ...made, kind: z.literal('damaged'), said: z.strictObject({ cylinderId, what: line(300), photoIds }) }),
  z.strictObject({ ...made, kind: z.literal('overdue'), said: z.strictObject({ cylinderId }) }),
  z.strictObject({ ...made, kind: z.literal('missing'), said: z.strictObject({ cylinderId }) }),
  z.strictObject({ ...made, kind: z.literal('unexpected'), said: z.strictObject({ serial: line(40), what: line(300).nullable().default(null), photoIds }) }),
  z.strictObject({
    ...made, kind: z.literal('graded'),
    said: z.strictObject({ cylinderId, grade: line(80).nullable().default(null), acceptedNet: massReading.nullable().default(null) })
      .refine(said => said.grade !== null || said.acceptedNet !== null, 'must hold a grade or an accepted net'),
  }),
  z.strictObject({ ...made, kind: z.literal('sent-back'), said: z.strictObject({ cylinderId, because: line(300).nullable().default(null) }) }),
  z.strictObject({ ...made, kind: z.literal('taken-out'), said: z.strictObject({ entryId: id }) }),
])

/** POST /api/dock/{token}/shipments/{id}/entries: what was said at the dock, in its order, by ids that the phone gave. */
export const dockEntriesBody = z.strictObject({
  deviceNow: z.iso.datetime({ offset: true }).optional(),
  entries: z.array(dockEntry).min(1).max(100).refine(entries => eachOnce(entries.map(entry => entry.id)), 'must name each entry once'),
})
export type DockEntriesBody = { deviceNow?: string, entries: DockEntry[] }

/** POST /api/dock/{token}/photos: one photo, by the id that its phone gave it. */
export const dockPhotoForm = uploadForm.omit({ eventId: true })

/** A cylinder of the shipment as the dock may see it. */
export interface DockCylinder {
  cylinderId: string
  serial: string | null
  labelCode: string | null
  specification: string | null
  refrigerant: string | null
  condition: string
  /** Our gross weight as it left; null until theirs is entered. */
  ourGross: MassReading | null
}

/** GET /api/dock/{token}: the one shipment that the link opens. */
export interface DockAnswer {
  shipment: { id: string, number: number, state: ShipmentState }
  /** Why no entries are taken; null while they are. */
  closed: string | null
  from: { name: string, telephone: string | null }
  to: { name: string }
  link: { id: string, forWhom: string, expiresAt: string }
  unit: MassUnit
  cylinders: DockCylinder[]
  entries: LinkedDockEntry[]
}

/** What became of one entry. */
export type DockResult = { id: string } & ({ outcome: 'accepted' | 'duplicate' } | { outcome: 'refused', problem: ProblemDetails })
export interface DockEntriesAnswer { results: DockResult[], dock: DockAnswer }
