import { append } from '../custody/append'
import type { Posting } from '../custody/posting'
import type { Database } from '../database/database'
import { demoAccess } from './cast'
import type { ScriptedEvent } from './script'

/** Most postings that wait for one commit. */
const AT_ONCE = 150

/** Records a script in the order in which its events reached the server, each at its own time. */
export async function recordScript(db: Database, events: readonly ScriptedEvent[]): Promise<void> {
  const versions = new Map<string, number>()
  const ordered = [...events].sort((a, b) => a.recordedAt - b.recordedAt || (a.body.id as string).localeCompare(b.body.id as string))
  let waiting: Promise<void>[] = []
  for (const together of dispatchesTogether(ordered)) {
    if (together[0]!.dispatchId) {
      await Promise.all(waiting)
      waiting = []
    }
    waiting.push(post(db, together, versions))
    if (waiting.length >= AT_ONCE) {
      await Promise.all(waiting)
      waiting = []
    }
  }
  await Promise.all(waiting)
}

/** Single events, and the events of one dispatch as one. */
function dispatchesTogether(ordered: readonly ScriptedEvent[]): ScriptedEvent[][] {
  const parts: ScriptedEvent[][] = []
  const open = new Map<string, ScriptedEvent[]>()
  for (const event of ordered) {
    const together = event.dispatchId ? open.get(event.dispatchId) : undefined
    if (together) {
      together.push(event)
      continue
    }
    const part = [event]
    parts.push(part)
    if (event.dispatchId) open.set(event.dispatchId, part)
  }
  return parts
}

async function post(db: Database, together: ScriptedEvent[], versions: Map<string, number>): Promise<void> {
  const first = together[0]!
  const posting: Posting = {
    access: demoAccess(first.author),
    now: first.recordedAt,
    deviceNow: first.recordedAt + first.clockAheadMs,
    events: together.map((event) => {
      const version = versions.get(event.cylinderId) ?? 0
      versions.set(event.cylinderId, version + 1)
      return event.decides ? { ...event.body, expects: version } : event.body
    }),
    ...(first.dispatchId ? { dispatch: { alongside: () => [] } } : {}),
  }
  const results = await append(db, posting)
  const refused = results.find(result => result.outcome === 'refused')
  if (refused) throw new Error(`The demo's ${String(together.find(event => event.id === refused.id)?.body.kind)} was refused: ${JSON.stringify(refused.problem)}`)
}
