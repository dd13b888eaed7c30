// Where the time of recording goes: the steps of one commit, each timed by itself, by the server's own modules.
import process from 'node:process'
import { median } from './measured.mjs'

const GROUP_EVENTS = 20
const GROUPS = 60
const WARM_UP_GROUPS = 15

/**
 * Processor time of each step for an event, in commits of twenty posts of one event. Sealing happens within judging, so
 * it is done once more to be timed.
 *
 * @returns medians by step, in µs.
 */
export async function stepsOfRecording({ db, parts, nextEvent, access }) {
  const costs = new Map()
  for (let turn = -WARM_UP_GROUPS; turn < GROUPS; turn++) {
    const texts = Array.from({ length: GROUP_EVENTS }, () => JSON.stringify(nextEvent()))
    for (const [step, cost] of await stepsOfOne(texts, { db, parts, access })) {
      if (turn >= 0) costs.set(step, [...costs.get(step) ?? [], cost / GROUP_EVENTS])
    }
  }
  return [...costs].map(([step, measured]) => ({ step, cost: median(measured) }))
}

async function stepsOfOne(texts, { db, parts, access }) {
  const { cylinderViews, group, groupCaches, insertLogRows, judgePosting, parsePost, requestUnits, sealedRow } = parts
  const costs = new Map()
  const now = Date.now()
  async function timed(step, work) {
    const before = process.cpuUsage()
    const result = await work()
    const { user, system } = process.cpuUsage(before)
    costs.set(step, user + system)
    return result
  }
  const postings = texts.map(text => ({ events: [JSON.parse(text)], access, now, deviceNow: null }))
  const parsed = await timed('parse', () => postings.map(({ events }) => events.map(parsePost)))
  const state = await timed('read', () => group(db, parsed.flat().map(({ event }) => event)))
  const judged = await timed('judge', () => postings.map((posting, index) => judgePosting({ posting, parsed: parsed[index], units: requestUnits(posting.events) }, state)))
  const rows = judged.flatMap(one => one.rows)
  if (rows.length !== texts.length) throw new Error(JSON.stringify(judged))
  await timed('seal', () => parsed.forEach(([post], index) => sealedRow(post, postings[index], { version: rows[index].version - 1, hash: rows[index].prev_hash }, rows[index].seq, rows[index].supervisor_id)))
  const caches = await timed('fold', () => groupCaches(db, state))
  await timed('commit', () => db.write([...insertLogRows(rows, state), ...caches.statements]))
  await timed('answer', () => Promise.all(rows.map(async row => JSON.stringify(await cylinderViews(db, [row.cylinder_id], { access, nowMs: now }, caches.standing)))))
  costs.set('judge', costs.get('judge') - costs.get('seal'))
  return costs
}
