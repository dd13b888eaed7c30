import type { KitReader } from '~~/composables/kitReader'
import { offlineLists, saturation } from '~~/composables/offlineLists'
import { useKitStore } from '~~/stores/kit'
import { useOutboxStore } from '~~/stores/outbox'
import { useSessionStore } from '~~/stores/session'
import type { CustodyLogAnswer, CylinderView, FleetAnswer, FoldInput } from '~~/utils/contract/custody'
import type { KitFirm } from '~~/utils/contract/kit'
import type { ProblemDetails } from '~~/utils/contract/problem'
import type { CylinderState } from '~~/utils/custody/state'

/** What was recorded so long before the copy last followed may have come too late for its question. */
const MAY_HAVE_MISSED_MS = 60_000

/** What is asked of a route, each value as its text. */
export type Asked = Readonly<Record<string, string>>

/** What an answer is made from. */
export interface Answering {
  reader: KitReader
  firm: KitFirm
  count: ReturnType<typeof useKitStore>['countHaving']
  /** Every cylinder is in the copy: only then can it list them, or say that there is none. */
  isWhole: boolean
  /** Of when the copy is (UTC milliseconds). */
  of: number
  nowMs: number
}

/** A copy that has everything has no such cylinder. */
export class NotInCopy extends Error {
  override readonly name = 'NotInCopy'
  readonly data: ProblemDetails = {
    type: 'not-in-copy', title: 'Not in this phone\'s copy', status: 404,
    detail: 'No cylinder in this phone\'s copy of the fleet has this code, serial or id. It may have come since.',
  }

  /** @param of of when the copy is (UTC milliseconds). */
  constructor(readonly of: number) {
    super('Not in this phone\'s copy')
  }
}

/**
 * What the server would answer to a question of the field's screens, from this device's copy with what waits on the device
 * on top of it, and of when the copy is (UTC milliseconds); null where the copy cannot tell.
 *
 * Errors: {@link NotInCopy} where a whole copy has no such cylinder.
 */
export async function answerFromCopy(path: string, query: Readonly<Record<string, unknown>> = {}): Promise<{ answer: unknown, of: number } | null> {
  const asked: Asked = Object.fromEntries(Object.entries(query).filter(([, value]) => value !== null && value !== undefined).map(([key, value]) => [key, String(value)]))
  // The past is read from the log.
  const route = 'asOf' in asked || 'knownAt' in asked ? null : routeOf(path)
  const found = route && await useKitStore().reading()
  if (!found) return null
  const answer = await route(await answeringFrom(found), asked)
  return answer === undefined ? null : { answer, of: found.about.followedAt }
}

/** Fetches and reads beforehand what every answer takes, so that the next one does not wait for it. */
export async function readyCopy(): Promise<void> {
  const found = await useKitStore().reading()
  if (found) await answeringFrom(found)
}

/** The answer of {@link answerFromCopy} alone; undefined where the copy cannot tell. */
export async function offlineAnswer(path: string, query?: Readonly<Record<string, unknown>>): Promise<unknown | undefined> {
  return (await answerFromCopy(path, query))?.answer
}

async function answeringFrom(found: NonNullable<Awaited<ReturnType<ReturnType<typeof useKitStore>['reading']>>>): Promise<Answering> {
  const [{ CATALOGUE }, { kitReader }] = await Promise.all([import('~~/utils/refrigerant/allRefrigerants'), import('~~/composables/kitReader')])
  const outbox = useOutboxStore()
  await outbox.read()
  const nowMs = Date.now()
  const lately = await outbox.recordedLately()
  // What was recorded a moment ago may still be shown as waiting: it counts once.
  const waiting = outbox.waiting.filter(({ id }) => !lately.some(done => done.id === id)).map(({ event }) => event)
  const recorded = lately.filter(({ recordedAt }) => recordedAt > found.about.followedAt - MAY_HAVE_MISSED_MS)
  const reader = await kitReader({ ...found, catalogue: CATALOGUE, waiting, recorded, asking: { nowMs, access: useSessionStore().access } })
  return { reader, firm: found.firm, count: useKitStore().countHaving, isWhole: found.about.next === null, of: found.about.followedAt, nowMs }
}

type Route = (answering: Answering, asked: Asked) => Promise<unknown | undefined>

function routeOf(path: string): Route | null {
  const [, collection, reference, part, ...more] = path.split('/').slice(1)
  if (more.length > 0) return null
  if (collection === 'cylinders' && reference !== undefined) {
    const answer = OF_CYLINDER[part ?? '']
    return answer ? async (answering, asked) => answer(await theCylinder(answering, decodeURIComponent(reference)), answering, asked) : null
  }
  if (collection === 'refrigerants' && reference !== undefined && part === 'saturation') return (_, asked) => saturation(decodeURIComponent(reference), asked)
  if (part !== undefined) return null
  if (collection === 'cylinders') return someCylinders
  return offlineLists(collection ?? '', reference ?? null)
}

type OnDevice = NonNullable<Awaited<ReturnType<KitReader['find']>>>

async function theCylinder({ reader, isWhole, of }: Answering, reference: string): Promise<OnDevice | null> {
  const found = await reader.find(reference)
  if (found === null && isWhole) throw new NotInCopy(of)
  return found
}

const OF_CYLINDER: Record<string, ((found: OnDevice | null, answering: Answering, asked: Asked) => Promise<unknown | undefined>) | undefined> = {
  '': async (found, { reader }, { refrigerant }): Promise<CylinderView | undefined> => found ? reader.viewOf(found, refrigerant ?? null) : undefined,
  'fold': async (found, { reader }): Promise<FoldInput | undefined> => {
    if (found === null) return undefined
    const { codesOnTwo, otherHalves } = await reader.saidOf(found.state)
    return { events: [], codesOnTwo: [...codesOnTwo], otherHalves: [...otherHalves], state: found.state }
  },
  'events': async (found): Promise<CustodyLogAnswer | undefined> => {
    if (found === null) return undefined
    const { id, labelCode, stamp, version } = found.state
    return { items: [], nextCursor: null, total: 0, cylinder: { id, labelCode, serial: stamp?.serial ?? null, version }, isWithServer: true }
  },
}

/** Cylinders by where they are, by a code or by the end of their stamp: what is asked in the field. */
async function someCylinders({ reader, isWhole }: Answering, asked: Asked): Promise<FleetAnswer | undefined> {
  const states = isWhole ? await statesFor(reader, asked) : undefined
  if (states === undefined) return undefined
  const items = (await reader.rowsOf(states)).sort((a, b) => urgency(a) - urgency(b) || (a.id < b.id ? -1 : 1))
  return { items: items.slice(0, Number(asked['limit'] ?? 50)), nextCursor: null, prevCursor: null, total: items.length }
}

async function statesFor(reader: KitReader, { limit: _, ...asked }: Asked): Promise<CylinderState[] | undefined> {
  const [by, ...more] = Object.keys(asked)
  if (by === undefined || more.length > 0) return undefined
  const value = asked[by]!
  switch (by) {
    case 'place': return reader.at(value)
    case 'holder': return reader.heldBy(value)
    case 'label': return reader.withCode(value)
    case 'q': return reader.endingWith(value)
    case 'finding': return value === 'code-on-two' ? reader.onTwo() : undefined
    default: return undefined
  }
}

/** Stops first, then cautions, then what has no weight. */
function urgency({ worstFinding, nothingInIt, netGrams }: FleetAnswer['items'][number]): number {
  if (worstFinding) return worstFinding.severity === 'stop' ? 0 : 1
  return nothingInIt || netGrams !== null ? 3 : 2
}
