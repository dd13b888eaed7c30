import canonicalize from 'canonicalize'
import type { Access } from '../../../utils/access/roles'
import { can } from '../../../utils/access/permissions'
import type { AnyCustodyEvent, AnyRecordedEvent, CustodyEvent } from '../../../utils/custody/event'
import { DECISION_KINDS, DISPATCH_KINDS, type EventKind } from '../../../utils/custody/kinds'
import { AUTHOR_CORRECTS_WITHIN_MS, mayPost } from '../../../utils/custody/posting'
import { DETAILS } from '../../../utils/custody/schema'
import { KIND_WORDS } from '../../../utils/custody/words'
import { parseEvent } from '../../../utils/custody/schema/parseEvent'
import type { ProblemDetails } from '../../../utils/contract/problem'
import { sha256 } from './sha256'

/** An event that was understood, with the hash by which a repetition is known. */
export interface ParsedPost { event: AnyCustodyEvent, body: string, contentHash: string }

/** Why an event was not taken, as the problem that is answered. */
export type Refusal = { refused: ProblemDetails }

/**
 * Parses one received event by its kind's schema. The hash is of the received canonical JSON, so that a repetition is
 * known whatever the schema adds later; the body is the event as understood: readings as entered, ids in lower case.
 */
export function parsePost(raw: unknown): ParsedPost | Refusal {
  const parsed = parseEvent(raw)
  if (!parsed.ok) return refuse(400, 'This event is not in order', 'Mend what is named and send it again.', parsed.errors)
  const received = canonicalize(raw)
  const body = canonicalize(parsed.event)
  if (received === undefined || body === undefined) return refuse(400, 'This event is not in order', 'It is not JSON.')
  return { event: parsed.event, body, contentHash: sha256(received) }
}

/** Ids that an event may name, each known or not. */
export interface KnownIds {
  place: (id: string) => boolean
  person: (id: string) => boolean
  firm: (id: string) => boolean
  scale: (id: string) => boolean
  shipment: (id: string) => boolean
  testLot: (id: string) => boolean
  job: (id: string) => boolean
}

type Known = keyof KnownIds

/** What each id inside an event or its details names. */
const ID_FIELDS: Record<string, Known> = {
  placeId: 'place', toPlaceId: 'place',
  supervisorId: 'person', toHolderId: 'person',
  fromFirmId: 'firm', ownerId: 'firm', ownerOfRefrigerantId: 'firm', toOwnerId: 'firm', requalifierId: 'firm', firmId: 'firm',
  scaleId: 'scale', shipmentId: 'shipment', lotId: 'testLot', jobId: 'job',
}

/** Kinds of which no role decides, but the entry that they name. */
const JUDGED_BY_EVENT = ['corrected', 'countersigned'] as const satisfies readonly EventKind[]

/** The ids that an event names and that nobody knows, as paths. */
export function unknownIds(event: AnyCustodyEvent, known: KnownIds): { path: string, message: string }[] {
  const errors: { path: string, message: string }[] = []
  const look = (path: string, holder: Record<string, unknown>) => {
    for (const [field, names] of Object.entries(ID_FIELDS)) {
      const value = holder[field]
      if (typeof value !== 'string') continue
      if (!known[names](value)) errors.push({ path: `${path}${field}`, message: `no such ${names === 'testLot' ? 'test lot' : names}` })
    }
  }
  look('', event as unknown as Record<string, unknown>)
  look('details.', event.details as Record<string, unknown>)
  if (event.kind === 'corrected' && event.details.instead) look('details.instead.', event.details.instead as Record<string, unknown>)
  return errors
}

/** Whether an event is judged by the cylinder's earlier ones: what it mends or signs, or the version it was decided on. */
export function looksBack({ kind, expects }: Pick<AnyCustodyEvent, 'kind' | 'expects'>): boolean {
  return expects !== undefined || (JUDGED_BY_EVENT as readonly EventKind[]).includes(kind)
}

/**
 * Whether this person may post this event on a cylinder as it stands now; null when so.
 *
 * A fact is never refused for its time nor for breaking a rule. What is refused: a kind outside the role, an id that
 * nobody knows, a decision made on another state of the cylinder, a correction that is not its author's to make.
 *
 * @param events the cylinder's events so far, the earlier ones of this request included; asked for where the event {@link looksBack}.
 */
export function refusalOf(
  event: AnyCustodyEvent, access: Access, events: () => readonly AnyRecordedEvent[], known: KnownIds, now: number, isDispatch: boolean,
): Refusal | null {
  if (!isDispatch && (DISPATCH_KINDS as readonly EventKind[]).includes(event.kind)) {
    return refuse(403, 'Only a dispatch writes this', 'Send the cylinder off with its shipment or its test lot.')
  }
  if (!isDispatch && !(JUDGED_BY_EVENT as readonly EventKind[]).includes(event.kind) && !mayPost(access, event.kind)) {
    return refuse(403, 'Not yours to record', `Your role may not record "${event.kind}".`)
  }
  const unknown = unknownIds(event, known)
  if (unknown.length > 0) return refuse(422, 'It names what nobody knows', 'Choose again from the list.', unknown)
  if (event.kind === 'corrected') return refusalOfCorrection(event, access, events(), now)
  return (event.kind === 'countersigned' ? refusalOfSignature(event, access, events()) : null) ?? wrongVersion(event, events)
}

// An entry that has not arrived yet may still prove to name this person.
function refusalOfSignature(event: CustodyEvent<'countersigned'>, access: Access, events: readonly AnyRecordedEvent[]): Refusal | null {
  const target = events.find(other => other.id === event.details.eventId)
  const isTheirs = !target || (target.supervisorId === access.personId && target.actorId !== access.personId)
  if (isTheirs && !access.trainee && mayPost(access, 'weighed')) return null
  return refuse(403, 'Not yours to sign', 'Only the supervisor whom the entry names signs it.')
}

function refusalOfCorrection(
  event: CustodyEvent<'corrected'>, access: Access, events: readonly AnyRecordedEvent[], now: number,
): Refusal | null {
  const target = events.find(other => other.id === event.details.eventId)
  const isAuthor = target?.actorId === access.personId && now - target.recordedAt <= AUTHOR_CORRECTS_WITHIN_MS
  const isManager = can(access, 'events:correct-any')
  if (target && !isManager && !isAuthor) {
    return refuse(403, 'Not yours to correct', 'Its author may correct it within 24 hours, a manager at any time.')
  }
  if (!target && !isManager && !mayPost(access, 'weighed')) {
    return refuse(403, 'Not yours to correct', 'Its author may correct it within 24 hours, a manager at any time.')
  }
  if (target?.kind === 'corrected' && !isManager && namesAnother(event.details.instead, target.details.eventId)) {
    return refuse(403, 'Not yours to correct', 'A correction of yours keeps to the entry it was made for; only a manager may point it at another.')
  }
  if (target?.kind === 'registered' && !event.details.instead && events.length > 1) {
    return refuse(409, 'The registration cannot be taken out', 'Other events stand on it. Give the right details instead.')
  }
  if (target && event.details.instead) {
    const instead = DETAILS[target.kind].safeParse(event.details.instead)
    if (!instead.success) {
      return refuse(400, 'The details given instead are not in order', `They must be those of "${target.kind}".`, instead.error.issues.map(issue => ({
        path: ['details', 'instead', ...issue.path].join('.'), message: issue.message,
      })))
    }
  }
  // The author's own correction may come from a phone that does not know the newest version.
  if (event.expects === undefined && isAuthor) return null
  return wrongVersion(event, () => events)
}

// Else a correction of one's own entry would open the way to anybody's.
function namesAnother(instead: Record<string, unknown> | undefined, eventId: string): boolean {
  const named = instead?.['eventId']
  return typeof named === 'string' && named.toLowerCase() !== eventId
}

function wrongVersion(event: AnyCustodyEvent, eventsOf: () => readonly AnyRecordedEvent[]): Refusal | null {
  const isDecision = (DECISION_KINDS as readonly EventKind[]).includes(event.kind)
  if (event.expects === undefined) {
    if (!isDecision) return null
    return refuse(400, 'A decision needs the version it was made on', 'Look at the cylinder again.', [{ path: 'expects', message: 'is missing' }])
  }
  const events = eventsOf()
  const version = events.at(-1)?.version ?? 0
  if (event.expects === version) return null
  const since = events.filter(other => other.version > (event.expects ?? 0)).map(({ kind }) => KIND_WORDS[kind].done.toLowerCase())
  return refuse(409, 'The cylinder has changed since you looked',
    `You decided on version ${event.expects}; it is now at ${version}.${since.length > 0 ? ` Recorded meanwhile: ${[...new Set(since)].join(', ')}.` : ''} Look again, then decide.`)
}

/** A refusal as a problem (RFC 9457). */
export function refuse(status: number, title: string, detail: string, errors?: { path: string, message: string }[]): Refusal {
  return { refused: { type: 'about:blank', title, status, detail, ...(errors ? { errors } : {}) } }
}
