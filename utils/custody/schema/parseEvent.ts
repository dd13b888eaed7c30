import { z } from 'zod'
import type { AnyCustodyEvent } from '../event'
import { otherCylinderOf } from '../half'
import { EVENT_KINDS, type EventKind } from '../kinds'
import { DETAILS } from '.'
import { deviceName, instant, line, prose, uuid } from './parts'

/** An event that was understood, or what is wrong with it, field by field. */
export type EventParse
  = | { ok: true, event: AnyCustodyEvent }
    | { ok: false, id: string | null, errors: { path: string, message: string }[] }

/** Kinds that only make sense at a place of ours; so does an exchange, of the cylinder that comes in. */
const NEEDS_PLACE: readonly EventKind[] = ['received', 'returned']

const envelope = z.strictObject({
  id: uuid,
  cylinderId: uuid,
  kind: z.enum(EVENT_KINDS, `must be one of ${EVENT_KINDS.join(', ')}`),
  occurredAt: instant,
  deviceId: deviceName.default(''),
  deviceSeq: z.int('must be a whole number').nonnegative('must not be negative').default(0),
  placeId: uuid.optional(),
  supervisorId: uuid.optional(),
  note: prose(2000).optional(),
  photoIds: z.array(uuid).max(20, 'must be at most 20 photos').optional(),
  practice: z.boolean('must be true or false').optional(),
  confirmed: z.array(line(40)).max(40, 'must be at most 40 codes').optional(),
  expects: z.int('must be a version: a whole number').nonnegative('must not be negative').optional(),
  details: z.unknown().refine(value => value !== undefined, 'is missing'),
})

/**
 * An event from what was sent, by its kind's schema.
 *
 * Errors: every fault is named by its path. Who acted and when it was recorded are not fields of an event, so naming
 * them is refused like any other unknown field.
 */
export function parseEvent(raw: unknown): EventParse {
  const outer = envelope.safeParse(raw)
  const kind = kindOf(raw)
  const details = fieldOf(raw, 'details')
  const inner = kind === null ? null : DETAILS[kind].safeParse(details)
  const errors = [
    ...problems(outer.error?.issues ?? [], raw, []),
    ...(details === undefined ? [] : problems(inner?.error?.issues ?? [], details, ['details'])),
  ]
  const comesIn = kind === 'exchanged' && fieldOf(details, 'direction') === 'in'
  if (kind !== null && (NEEDS_PLACE.includes(kind) || comesIn) && outer.data?.placeId === undefined && !errors.some(error => error.path === 'placeId')) {
    errors.push({ path: 'placeId', message: 'is missing: say where the cylinder is now' })
  }
  const other = inner?.success && kind !== null ? otherCylinderOf(kind, inner.data) : null
  if (other !== null && other === outer.data?.cylinderId) {
    errors.push({ path: kind === 'transferred' ? 'details.counterpartId' : 'details.otherCylinderId', message: 'must be another cylinder' })
  }
  if (errors.length > 0 || !outer.success || !inner?.success) return { ok: false, id: idOf(raw), errors }
  // The details were parsed by the schema of this very kind, which the compiler cannot follow.
  return { ok: true, event: { ...outer.data, details: inner.data } as AnyCustodyEvent }
}

function problems(issues: readonly z.core.$ZodIssue[], parsed: unknown, under: string[]): { path: string, message: string }[] {
  return issues.flatMap((issue) => {
    const path = [...under, ...issue.path.map(String)]
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map(key => ({ path: [...path, key].join('.'), message: 'is not a field that can be given here' }))
    }
    const isMissing = issue.path.length > 0 && valueAt(parsed, issue.path) === undefined
    return [{ path: path.join('.'), message: isMissing ? 'is missing' : issue.message }]
  })
}

function kindOf(raw: unknown): EventKind | null {
  const kind = fieldOf(raw, 'kind')
  return EVENT_KINDS.find(known => known === kind) ?? null
}

function idOf(raw: unknown): string | null {
  const id = fieldOf(raw, 'id')
  return typeof id === 'string' ? id : null
}

function valueAt(parsed: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>((value, step) => fieldOf(value, step), parsed)
}

function fieldOf(raw: unknown, name: PropertyKey): unknown {
  return typeof raw === 'object' && raw !== null && Object.hasOwn(raw, name) ? (raw as Record<PropertyKey, unknown>)[name] : undefined
}
