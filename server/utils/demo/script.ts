import type { EventKind } from '../../../utils/custody/kinds'
import type { DetailsOf } from '../../../utils/custody/schema'
import { HOUR, localIso, MINUTE } from './calendar'
import { DEMO_TIME_ZONE, type DemoPerson } from './cast'
import type { Random } from './random'

/** One event of the demo's past, waiting to be recorded. */
export interface ScriptedEvent {
  id: string
  author: DemoPerson
  recordedAt: number
  /** How far the author's clock ran ahead when it was sent, milliseconds. */
  clockAheadMs: number
  cylinderId: string
  /** The log asks which version a decision was made on; filled in when it is recorded. */
  decides: boolean
  /** Events of one dispatch carry its id and are recorded together. */
  dispatchId: string | null
  body: Record<string, unknown>
}

/** What of an event is not the everyday. */
export interface EventOptions {
  placeId?: string
  supervisorId?: string
  note?: string
  confirmed?: string[]
  decides?: boolean
  dispatchId?: string
  /** How long after it happened it was recorded; some minutes to two days unless given. */
  lateMs?: number
  clockAheadMs?: number
  practice?: boolean
}

/** The demo's past as it is being written down. */
export interface Script {
  events: ScriptedEvent[]
  add: <K extends EventKind>(author: DemoPerson, at: number, cylinderId: string, kind: K, details: DetailsOf<K>, options?: EventOptions) => string
}

/** An empty script that ends at `endAt`: nothing happens or is recorded after it. */
export function newScript(random: Random, endAt: number): Script {
  const events: ScriptedEvent[] = []
  const sequence = new Map<string, number>()
  return {
    events,
    add(author, at, cylinderId, kind, details, options = {}) {
      const id = random.uuid(at)
      const deviceSeq = (sequence.get(author.id) ?? 0) + 1
      sequence.set(author.id, deviceSeq)
      const clockAheadMs = options.clockAheadMs ?? 0
      const { placeId, supervisorId, note, confirmed, practice } = options
      events.push({
        id,
        author,
        cylinderId,
        recordedAt: Math.min(endAt, at + (options.lateMs ?? usualDelay(random))),
        clockAheadMs,
        decides: options.decides ?? false,
        dispatchId: options.dispatchId ?? null,
        body: {
          id, cylinderId, kind, deviceSeq,
          occurredAt: localIso(at + clockAheadMs, DEMO_TIME_ZONE),
          deviceId: `demo-${author.email.split('@')[0]}`,
          ...Object.fromEntries(Object.entries({ placeId, supervisorId, note, confirmed, practice }).filter(([, value]) => value !== undefined)),
          details,
        },
      })
      return id
    },
  }
}

/** Mostly within minutes; now and then from a plant room without signal, up to two days later. */
function usualDelay(random: Random): number {
  if (random.chance(0.88)) return random.whole(1, 12) * MINUTE
  if (random.chance(0.8)) return random.whole(1, 9) * HOUR
  return random.whole(20, 47) * HOUR
}
