import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { places } from '../../../drizzle/schema'
import { dateBounds } from '../../../server/utils/custody/dateBounds'
import { fleet, fleetPage } from '../../../server/utils/custody/fleet'
import { fleetCursorText } from '../../../server/utils/custody/fleetCursor'
import { rowColumns } from '../../../server/utils/custody/listedRows'
import { statement } from '../../../server/utils/database/database'
import { directory } from '../../../server/utils/directory/directory'
import { rulesInForceKey } from '../../../server/utils/directory/datedRules'
import { fleetQuery, type CylinderRow, type FleetQuery } from '../../../utils/contract/custody'
import { FLEET_CHOICES } from '../../../utils/contract/fleetQuestion'
import { fleetRows } from '../../helpers/fleetRows'
import { openLogDatabase, type LogDatabase } from '../../helpers/logDatabase'

const NOW = Date.parse('2026-12-01T18:00:00Z')
const MANY = 1_200

let log: LogDatabase
let shop: string
let rack: string
const owner = randomUUID()

beforeAll(async () => {
  log = await openLogDatabase()
  shop = log.placeId
  rack = randomUUID()
  const bay = randomUUID()
  await log.db.write([
    statement(log.db.read.insert(places).values({ id: rack, name: 'Aisle 2', kind: 'rack', parentId: shop, createdAt: 0 })),
    statement(log.db.read.insert(places).values({ id: bay, name: 'Bay 7', kind: 'rack', parentId: rack, createdAt: 0 })),
  ])
  const from = await directory(log.db, true)
  await log.db.write(fleetRows(MANY, {
    places: [shop, rack, bay], holders: [log.technician.personId], owner, ruledBy: rulesInForceKey(from, NOW), nowMs: NOW,
  }))
})
afterAll(() => log.close())

const asked = (query: Record<string, unknown>): FleetQuery => fleetQuery.parse(query)
const page = (query: Record<string, unknown>) => fleet(log.db, asked(query), NOW)

/** The whole list, page by page. */
async function whole(query: Record<string, unknown>): Promise<CylinderRow[]> {
  const rows: CylinderRow[] = []
  for (let cursor: string | null | undefined; cursor !== null;) {
    const answer = await page({ ...query, limit: 150, ...(cursor && { cursor }) })
    rows.push(...answer.items)
    cursor = answer.nextCursor
  }
  return rows
}

const SHOWN: Record<Exclude<FleetQuery['sort'], 'urgency'>, (row: CylinderRow) => string | number | null> = {
  'code': row => row.labelCode,
  'serial': row => row.serial,
  'refrigerant': row => row.refrigerant,
  'condition': row => row.condition,
  'lifecycle': row => row.lifecycle,
  'net': row => row.netGrams,
  'room': row => row.roomGrams,
  'stop': row => row.stopWeightGrams,
  'due': row => row.dueMonth,
  'place': row => row.place?.name ?? null,
  'last-event': row => row.lastEventAt,
}

describe('each order of the fleet', () => {
  it.each(Object.entries(SHOWN))('by %s goes up and down, holds every cylinder once, and has what is not known last', async (sort, value) => {
    for (const order of ['asc', 'desc']) {
      const rows = await whole({ sort, order })
      expect(new Set(rows.map(row => row.id)).size).toBe(MANY)
      const values = rows.map(value)
      const known = values.filter(one => one !== null)
      expect(values.slice(0, known.length)).toEqual(known)
      const up = order === 'asc' ? known : known.toReversed()
      expect(up.every((one, index) => index === 0 || up[index - 1]! <= one)).toBe(true)
    }
  })

  it('by urgency has stops before cautions before what nothing is said of, and turns round', async () => {
    const rows = await whole({ sort: 'urgency' })
    expect(rows).toHaveLength(MANY)
    const grade = (row: CylinderRow) => row.worstFinding === null ? row.netGrams === null && !row.nothingInIt ? 2 : 3 : row.worstFinding.severity === 'stop' ? 0 : 1
    const grades = rows.map(grade)
    expect(grades).toEqual(grades.toSorted())
    expect(new Set(grades)).toEqual(new Set([0, 1, 2, 3]))
    expect((await whole({ sort: 'urgency', order: 'desc' })).map(row => row.id)).toEqual(rows.map(row => row.id).toReversed())
  })

  it('leaves room and stop weight of a late cylinder among what is not known', async () => {
    const last = (await whole({ sort: 'room', order: 'desc' })).slice(-40)
    expect(last.every(row => row.roomGrams === null)).toBe(true)
    expect(last.some(row => row.findingCodes.includes('retest-overdue') && row.netGrams !== null && row.fillLimitGrams !== null)).toBe(true)
  })
})

describe('the pages of the fleet', () => {
  it.each(FLEET_CHOICES.sort.flatMap(sort => ['asc', 'desc'].map(order => [sort, order])))('by %s %s lead forth and back over the same cylinders', async (sort, order) => {
    const first = await page({ sort, order, limit: 90 })
    const second = await page({ sort, order, limit: 90, cursor: first.nextCursor })
    const third = await page({ sort, order, limit: 90, cursor: second.nextCursor })
    const back = await page({ sort, order, limit: 90, cursor: third.prevCursor })
    expect(back.items).toEqual(second.items)
    const begin = await page({ sort, order, limit: 90, cursor: back.prevCursor })
    expect(begin.items).toEqual(first.items)
    expect([first.prevCursor, begin.prevCursor]).toEqual([null, null])
    expect(third.total).toBe(MANY)
  })

  it('neither skip nor repeat a cylinder where others came, went or moved between two pages', async () => {
    const other = await openLogDatabase()
    const from = await directory(other.db, true)
    await other.db.write(fleetRows(300, { places: [other.placeId], holders: [other.technician.personId], owner, ruledBy: rulesInForceKey(from, NOW), nowMs: NOW }))
    const ask = (cursor?: string) => fleet(other.db, asked({ sort: 'net', limit: 100, ...(cursor && { cursor }) }), NOW)
    const all = (await fleet(other.db, asked({ sort: 'net', limit: 200 }), NOW)).items
    const first = await ask()
    // One that was read already goes to the end, one that was to come is gone, and a new one stands before all.
    await other.db.write([
      { sql: 'UPDATE cylinders SET net_grams = 14999 WHERE id = ?', args: [all[10]!.id] },
      { sql: 'DELETE FROM cylinders WHERE id = ?', args: [all[120]!.id] },
      { sql: `UPDATE cylinders SET id = '00000000-0000-7000-8000-000000000000', net_grams = 0 WHERE id = ?`, args: [all[150]!.id] },
    ])
    const second = await ask(first.nextCursor!)
    const stayed = all.slice(100, 200).map(row => row.id).filter(id => id !== all[120]!.id && id !== all[150]!.id)
    expect(second.items.map(row => row.id).slice(0, stayed.length)).toEqual(stayed)
    expect(second.total).toBe(299)
    const back = await fleet(other.db, asked({ sort: 'net', limit: 200, cursor: second.prevCursor! }), NOW)
    expect(back.items.map(row => row.id)).not.toContain(all[10]!.id)
    expect(back.items.map(row => row.id)).toContain('00000000-0000-7000-8000-000000000000')
    other.close()
  })

  it('go on behind a place of the longest name', () => {
    const cursor = fleetCursorText({ isBackward: false, stretch: 0, value: '\u51B7'.repeat(80), id: randomUUID() }, { sort: 'last-event', order: 'desc' })
    expect(fleetQuery.safeParse({ cursor }).success).toBe(true)
  })

  it('refuse a cursor of another order, and one that nobody gave', async () => {
    const { nextCursor } = await page({ sort: 'net', limit: 10 })
    for (const query of [{ sort: 'due', cursor: nextCursor }, { sort: 'net', order: 'desc', cursor: nextCursor }, { cursor: 'abc' }, { cursor: Buffer.from('["net","asc",1,9,0,"x"]').toString('base64url'), sort: 'net' }]) {
      await expect(page(query)).rejects.toMatchObject({ details: { status: 400 } })
    }
  })
})

const FILTERS: [string, Record<string, unknown>, (row: CylinderRow) => boolean][] = [
  ['holder', {}, row => row.holder !== null],
  ['refrigerant', { refrigerant: 'R-22' }, row => row.refrigerant === 'R-22'],
  ['condition', { condition: 'burnt' }, row => row.condition === 'burnt'],
  ['lifecycle', { lifecycle: 'at-test' }, row => row.lifecycle === 'at-test'],
  ['dueBefore', { dueBefore: '2027-03' }, row => row.dueMonth !== null && row.dueMonth < '2027-03' && row.lifecycle !== 'retired'],
  ['finding retest-overdue', { finding: 'retest-overdue' }, row => row.findingCodes.includes('retest-overdue')],
  ['finding retest-soon', { finding: 'retest-soon' }, row => row.findingCodes.includes('retest-soon')],
  ['finding not-seen', { finding: 'not-seen' }, row => row.findingCodes.includes('not-seen')],
  ['finding overfill', { finding: 'overfill' }, row => row.findingCodes.includes('overfill')],
  ['finding nearly-full', { finding: 'nearly-full' }, row => row.findingCodes.includes('nearly-full')],
  ['finding stop', { finding: 'stop' }, row => row.worstFinding?.severity === 'stop'],
  ['finding caution', { finding: 'caution' }, row => row.worstFinding !== null],
  ['place', {}, row => row.place?.name === 'Aisle 2' || row.place?.name === 'Bay 7'],
  ['owner', { owner }, () => true],
  ['q by serial', { q: 'K0011' }, row => row.serial!.includes('K0011')],
  ['q by place', { q: 'bay' }, row => row.place?.name === 'Bay 7'],
]

const ownFilters = () => FILTERS.map(([name, query, fits]) => [name, name === 'holder' ? { holder: log.technician.personId } : name === 'place' ? { place: rack } : query, fits] as const)

describe('each filter of the fleet', () => {
  it('lets through what it names and nothing else, and says how many', async () => {
    const all = await whole({})
    for (const [name, query, fits] of ownFilters()) {
      const found = await whole({ ...query, sort: 'serial' })
      expect(found.every(fits), name).toBe(true)
      if (name !== 'owner') expect(found.length, name).toBe(all.filter(fits).length)
      expect(found.length, name).toBeGreaterThan(0)
      expect(found.length, name).toBeLessThan(MANY)
      expect((await page(query)).total, name).toBe(found.length)
    }
  })

  it('finds one by its label, in any spelling', async () => {
    const [first] = (await page({ sort: 'code', limit: 1 })).items
    const spelled = `${first!.labelCode!.slice(0, 3)} ${first!.labelCode!.slice(3).toLowerCase()}`
    expect((await page({ label: spelled })).items.map(row => row.id)).toEqual([first!.id])
  })

  it('finds a code by a part of it, an O read as 0', async () => {
    const coded = (await whole({ sort: 'code' })).find(row => row.labelCode?.includes('0'))!
    const found = await page({ q: ` ${coded.labelCode!.slice(0, 5)}-${coded.labelCode!.slice(5)}`.replaceAll('0', 'o') })
    expect(found.items.map(row => row.id)).toContain(coded.id)
  })

  it('goes together with the others', async () => {
    const found = await whole({ refrigerant: 'R-22', finding: 'caution', q: 'K00' })
    expect(found.length).toBeGreaterThan(0)
    expect(found.every(row => row.refrigerant === 'R-22' && row.worstFinding !== null && row.serial!.startsWith('K00'))).toBe(true)
  })

  it('is refused where it is none of ours', () => {
    expect(fleetQuery.safeParse({ colour: 'red' }).success).toBe(false)
    expect(fleetQuery.safeParse({ sort: 'colour' }).success).toBe(false)
  })
})

describe('the plan of a page', () => {
  async function planOf(query: Record<string, unknown>): Promise<string[]> {
    const from = await directory(log.db)
    const page = fleetPage(asked(query), null, dateBounds(from, NOW), rowColumns(from, NOW)) as { sql: string, args: never[] }
    const plan = await log.db.readClient.execute({ sql: `EXPLAIN QUERY PLAN ${page.sql}`, args: page.args })
    return plan.rows.map(row => row['detail'] as string)
  }

  // A cylinder is found by part of a text only by looking at each.
  it('looks cylinders up by an index, whatever the filter, but for part of a text', async () => {
    for (const [name, query] of ownFilters()) {
      if (name.startsWith('q ')) continue
      const plan = await planOf(query)
      expect(plan.filter(step => /^SCAN c\b(?!.*USING)/.test(step)), `${name}: ${plan.join('\n')}`).toEqual([])
      expect(plan.filter(step => /^SCAN p\b/.test(step)), name).toEqual([])
    }
  })

  it('reads every order along its index without sorting the fleet, but for the name of a place', async () => {
    for (const sort of FLEET_CHOICES.sort) {
      for (const order of ['asc', 'desc']) {
        const sorts = (await planOf({ sort, order })).filter(step => step.includes('USE TEMP B-TREE'))
        expect(sorts.length > 0, `${sort} ${order}`).toBe(sort === 'place')
      }
    }
  })
})
