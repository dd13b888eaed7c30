import { isCertified } from '../../../utils/access/certification'
import { DOUBTFUL_CLAMP_MS, DOUBTFUL_SKEW_S } from '../../../utils/custody/fold/raiseCommon'
import type { EntryFacts, NowFacts, ScaleFacts } from '../../../utils/now/nowFacts'
import { dayOfInstant } from '../../../utils/quantity/day'
import { MS_PER_DAY } from '../../../utils/quantity/instant'
import { scaleCheck } from '../../../utils/quantity/scaleCheck'
import { lastVerification } from '../custody/lastVerification'
import type { Database } from '../database/database'
import type { Directory } from '../directory/directory'

const WEEK_MS = 7 * MS_PER_DAY
/** A rule is told of so long before it begins: common practice, no source. */
const RULE_TOLD_DAYS = 14

/** How the last check of the custody log went and how many lines have come since. */
export async function logCheckFacts(db: Database): Promise<NowFacts['logCheck']> {
  const last = await lastVerification(db)
  const { rows } = await db.readClient.execute({
    // Numbers follow the order of recording, so what came since is read from the end.
    sql: 'SELECT count(*) FROM custody_events WHERE seq > coalesce((SELECT seq FROM custody_events WHERE recorded_at <= ? ORDER BY seq DESC LIMIT 1), 0)',
    args: [last?.at ?? -1],
  })
  return { last, newEvents: rows[0]?.[0] as number }
}

/** What was recorded this week by a doubtful clock, more than a day late, or as a correction. */
export async function entryFacts(db: Database, nowMs: number): Promise<NowFacts['entries']> {
  const [doubtful, late, corrected] = await Promise.all([
    entries(db, nowMs, 'abs(e.clock_skew_seconds) > ? OR e.occurred_at - e.clock_skew_seconds * 1000 - e.effective_at >= ?', [DOUBTFUL_SKEW_S, DOUBTFUL_CLAMP_MS]),
    entries(db, nowMs, 'e.recorded_at - e.effective_at > ?', [MS_PER_DAY]),
    entries(db, nowMs, `e.kind = 'corrected'`, []),
  ])
  return { doubtful, late, corrected }
}

async function entries(db: Database, nowMs: number, where: string, args: number[]): Promise<EntryFacts> {
  const { rows: [row] } = await db.readClient.execute({
    sql: `WITH week AS (SELECT e.seq, e.cylinder_id FROM custody_events e
        WHERE e.seq > coalesce((SELECT seq FROM custody_events WHERE recorded_at <= ? ORDER BY seq DESC LIMIT 1), 0) AND (${where}))
      SELECT (SELECT count(*) FROM week), (SELECT count(DISTINCT cylinder_id) FROM week), c.id, c.label_code, c.serial
      FROM week JOIN cylinders c ON c.id = week.cylinder_id ORDER BY week.seq DESC LIMIT 1`,
    args: [nowMs - WEEK_MS, ...args],
  })
  if (!row) return { count: 0, cylinders: 0, newest: null }
  return { count: row[0] as number, cylinders: row[1] as number, newest: { id: row[2] as string, labelCode: row[3] as string | null, serial: row[4] as string | null } }
}

/** Letters that could not be sent, while no later one has reached the same address. */
export async function mailFacts(db: Database): Promise<NowFacts['mailFailed']> {
  const { rows: [row] } = await db.readClient.execute(
    `SELECT m.recipient, count(*) OVER () FROM mail m WHERE m.error IS NOT NULL AND m.sent_at IS NULL
      AND NOT EXISTS (SELECT 1 FROM mail l WHERE l.recipient = m.recipient AND l.created_at > m.created_at AND l.sent_at IS NOT NULL)
      ORDER BY m.created_at DESC, m.id LIMIT 1`,
  )
  return row && { recipient: row[0] as string, count: row[1] as number }
}

/** The firm's next rule, where it begins soon. */
export function ruleFacts(from: Directory, nowMs: number): NowFacts['rule'] {
  const coming = [...from.fillPolicies.map(({ fromAt }) => ({ fromAt, isFillRule: true })), ...from.retests.map(({ fromAt }) => ({ fromAt, isFillRule: false }))]
    .filter(({ fromAt }) => fromAt > nowMs && fromAt <= nowMs + RULE_TOLD_DAYS * MS_PER_DAY)
    .sort((a, b) => a.fromAt - b.fromAt)
  return coming[0] && { ...coming[0], count: coming.length }
}

/** Scales in use whose last check is over a year old or known to nobody. */
export function scaleFacts(from: Directory, nowMs: number): ScaleFacts[] {
  const today = dayOfInstant(nowMs, from.timeZone)
  return [...from.scales.values()]
    .filter(({ active, lastCheck }) => active && scaleCheck(lastCheck, today) !== 'in-date')
    .map(({ name, lastCheck }) => ({ name, lastCheckOn: lastCheck }))
    .sort((a, b) => a.name.localeCompare(b.name, 'en'))
}

/** What is still to be written down of people and places. */
export function peopleAndPlaces(from: Directory): Pick<NowFacts, 'uncertified' | 'notTakenUp' | 'missing'> {
  const people = [...from.people.values()].filter(({ active }) => active)
  const places = [...from.places.values()].filter(({ active }) => active)
  const firms = [...from.firms.values()].filter(({ active }) => active)
  return {
    uncertified: people.filter(one => one.roles.includes('technician') && !one.trainee && !isCertified(one)).map(({ name }) => name).sort(),
    notTakenUp: people.filter(({ passwordHash }) => passwordHash === null).map(({ name }) => name).sort(),
    missing: {
      shop: !places.some(({ kind }) => kind === 'shop'),
      reclaimer: !firms.some(({ kind }) => kind === 'reclaimer'),
      testStation: !firms.some(({ kind }) => kind === 'requalifier'),
      vansWithoutTechnician: places.filter(({ kind, technicianId }) => kind === 'van' && technicianId === null).map(({ name }) => name).sort(),
    },
  }
}
