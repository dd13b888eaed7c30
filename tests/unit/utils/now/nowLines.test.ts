import { describe, expect, it } from 'vitest'
import { can, type Permission } from '../../../../utils/access/permissions'
import type { Role } from '../../../../utils/access/roles'
import { nowLines, type NowReader } from '../../../../utils/now/nowLines'
import type { CylinderFacts, NowFacts } from '../../../../utils/now/nowFacts'
import { topicsFor } from '../../../../utils/now/nowTopics'
import { vanLoad } from '../../../../utils/transport/vanLoad'
import { cylinderRow } from '../../../helpers/cylinderRow'

const NOON = Date.UTC(2026, 11, 1, 18)
const DAY = 86_400_000
const ID = '01900000-0000-7000-8000-000000000001'

function reader(roles: Role[], more: Partial<NowReader> = {}): NowReader {
  return { unit: 'lb', now: NOON, timeZone: 'America/Chicago', mayI: (permission: Permission) => can({ personId: 'p', roles, trainee: false }, permission), ...more }
}

function linesFor(role: Role, facts: Partial<NowFacts>, more: Partial<NowReader> = {}) {
  return nowLines({ cylinders: {}, lastSoonMonth: '2027-03', ...facts }, topicsFor([role]), reader([role], more))
}

function found(change: Partial<CylinderFacts> = {}): CylinderFacts {
  return { question: { finding: 'overfill' }, count: 1, netGrams: 10_251, withContents: 1, first: [cylinderRow()], ...change }
}

describe('an overfilled cylinder', () => {
  // 38.8 lb = 17,599 g in one that may hold 38.1 lb = 17,282 g: 317 g = 0.699 lb too much, which is said as 0.7 lb.
  const over = found({ first: [cylinderRow({ netGrams: 17_599, fillLimitGrams: 17_282 })] })

  it('says by how much, where, and leads to drawing it down', () => {
    expect(linesFor('manager', { cylinders: { overfilled: over } })).toEqual([{
      key: 'overfilled', topic: 'overfilled', kind: 'stop', number: 1,
      sentence: '1 cylinder is overfilled, by 0.7\u00A0lb.', reason: '7K3 M9Q 2TX, R-410A, Van 12. Keep it cool and off the road until drawn down.',
      verb: 'Draw it down', to: '/c/7k3m9q2tx/act/drawn',
    }])
  })

  it('is said in the unit of the person\'s scale, an excess rounded up', () => {
    // 317 g is 0.317 kg, and 11.2 oz.
    expect(linesFor('manager', { cylinders: { overfilled: over } }, { unit: 'kg' })[0]!.sentence).toBe('1 cylinder is overfilled, by 0.32\u00A0kg.')
    expect(linesFor('manager', { cylinders: { overfilled: over } }, { unit: 'lb-oz' })[0]!.sentence).toBe('1 cylinder is overfilled, by 12\u00A0oz.')
  })

  it('leads to the list of just these where there are two', () => {
    const [line] = linesFor('warehouse', { cylinders: { overfilled: found({ ...over, count: 2 }) } })
    expect(line).toMatchObject({ number: 2, sentence: '2 cylinders are overfilled, the first by 0.7\u00A0lb.', verb: 'Show the 2', to: '/fleet?finding=overfill' })
  })

  it('is no line where there is none', () => {
    expect(linesFor('manager', { cylinders: { overfilled: found({ count: 0 }) } })).toEqual([])
  })

  it('is not told to the auditor', () => {
    expect(linesFor('auditor', { cylinders: { overfilled: over } })).toEqual([])
  })
})

describe('what a technician holds', () => {
  const question = { finding: 'stop' as const, holder: ID }

  it('says a stop once: overfilled ones and empty ones late for their retest have their own line', () => {
    const stops = found({ question, count: 3 })
    const topics = (overfilled: number) => linesFor('technician', { cylinders: {
      'held-stop': stops, 'held-overfilled': found({ count: overfilled }), 'held-late': found({ count: 2, withContents: 1 }),
    } }).map(({ topic, number }) => `${topic} ${number}`)
    expect(topics(2)).toEqual(['held-overfilled 2', 'held-late 2'])
    expect(topics(1)).toEqual(['held-overfilled 1', 'held-stop 1', 'held-late 2'])
  })

  it('leads a nearly full one to its move back', () => {
    expect(linesFor('technician', { cylinders: { 'held-full': found({ netGrams: 15_876 }) } })[0]).toMatchObject({
      sentence: '1 that you hold is full or nearly full.', reason: '7K3 M9Q 2TX, R-410A, Van 12, 35.0\u00A0lb net. Take an empty one along instead.', to: '/c/7k3m9q2tx/act/moved',
    })
  })

  it('is too much for the van above 440 lb gross, and not at it', () => {
    // 440 lb = 199,580.6 g.
    const aboard = (grams: number) => [66_000, 66_000, grams - 132_000].map(tareWeightGrams => ({ tareWeightGrams, netGrams: 0 }))
    const lines = (grams: number) => linesFor('technician', { vans: [{ id: ID, name: 'Van 12', load: vanLoad(aboard(grams)) }] })
    expect(lines(199_580)).toEqual([])
    expect(lines(200_034)[0]).toMatchObject({ topic: 'van-load', sentence: 'Van 12 carries 1.0\u00A0lb too much.', to: '/van' })
  })

  it('is too heavy for the van above 220 lb in one', () => {
    // 220 lb = 99,790.3 g.
    const lines = (grams: number) => linesFor('technician', { vans: [{ id: ID, name: 'Van 12', load: vanLoad([{ tareWeightGrams: grams, netGrams: 0 }]) }] })
    expect(lines(99_790)).toEqual([])
    expect(lines(99_791)[0]!.sentence).toBe('1 cylinder on Van 12 is too heavy.')
  })

  it('is told of each of two vans, and leads to the one it is about', () => {
    const load = vanLoad([{ tareWeightGrams: 99_791, netGrams: 0 }])
    const lines = linesFor('technician', { vans: [{ id: 'first', name: 'Van 12', load: vanLoad([]) }, { id: 'second', name: 'Van 14', load }] })
    expect(lines).toEqual([expect.objectContaining({ key: 'van-load second', sentence: '1 cylinder on Van 14 is too heavy.', to: '/vans/second' })])
  })
})

describe('what is planned', () => {
  it('leads to the plan that is open, and to all where several are, also who carries it out', () => {
    expect(linesFor('technician', { plansOpen: { id: ID, number: 3, plans: 1, steps: 1 } })).toMatchObject([{
      topic: 'plan-steps', number: 1, sentence: '1 transfer is planned that frees a cylinder.', reason: 'Plan 3 is open. Its cylinders are on no other plan meanwhile.', to: `/plans/${ID}`,
    }])
    expect(linesFor('warehouse', { plansOpen: { id: ID, number: 3, plans: 2, steps: 9 } })[0]).toMatchObject({
      sentence: '9 transfers are planned that free cylinders.', reason: '2 plans are open, the oldest is plan 3.', to: '/plans',
    })
    expect(linesFor('auditor', { plansOpen: { id: ID, number: 3, plans: 1, steps: 1 } })).toEqual([])
  })
})

describe('what is worth a pick-up', () => {
  const worthPickUp = { firm: 'Halvern', place: 'North shop', refrigerant: 'R-22', cylinders: 2, netGrams: 61_734, comesToCents: 62_945 }

  it('says how much of what, whom it goes to and what it comes to, to who ships', () => {
    expect(linesFor('warehouse', { worthPickUp })).toMatchObject([{
      topic: 'worth-pick-up', number: 2, sentence: '136.1\u00A0lb of R-22 are worth a pick-up.',
      reason: 'Halvern would take 2 cylinders from North shop, for $629.45 after the pick-up.', to: '/reclaim',
    }])
    expect(linesFor('technician', { worthPickUp })).toEqual([])
  })

  it('says no amount where one is not known', () => {
    expect(linesFor('manager', { worthPickUp: { ...worthPickUp, refrigerant: null, comesToCents: null } })[0]).toMatchObject({
      sentence: '136.1\u00A0lb in 2 cylinders are worth a pick-up.', reason: 'Halvern would take 2 cylinders from North shop.',
    })
  })
})

describe('what is full in the shop', () => {
  it('is a line for each refrigerant, with its pounds and places, and begins a shipment of just these', () => {
    // 61,734 g = 136.1 lb.
    const lines = linesFor('manager', { full: [
      { refrigerant: 'R-22', netGrams: 61_734, ids: ['a', 'b'], places: ['Main shop'] }, { refrigerant: 'R-410A', netGrams: 10_000, ids: ['c'], places: ['Bay 1', 'Bay 2'] },
    ] })
    expect(lines.map(({ key }) => key)).toEqual(['full R-22', 'full R-410A'])
    expect(lines[0]).toMatchObject({ number: 2, sentence: '2 full, ready to ship.', reason: '136.1\u00A0lb of R-22 in Main shop.', verb: 'Start a shipment', to: '/shipments?with=a,b' })
    expect(lines[1]!.reason).toBe('22.0\u00A0lb of R-410A in Bay 1 and Bay 2.')
  })
})

describe('what was not seen', () => {
  it('is named by who had it last, and what may be missing is counted apart', () => {
    const unseen = { days: 30, longDays: 90, longCount: 1, holders: [{ name: 'Tina', count: 2 }, { name: null, count: 1 }] }
    expect(linesFor('manager', { cylinders: { 'not-seen': found({ question: { finding: 'not-seen' }, count: 3 }) }, unseen })[0]).toMatchObject({
      kind: 'unk', sentence: '3 cylinders were not seen for 30 days.', reason: 'Last with Tina (2) and nobody (1). 1 for 90 days or more: missing?', to: '/fleet?finding=not-seen',
    })
  })
})

describe('retests', () => {
  it('that are late say what is still in the cylinders', () => {
    const late = (withContents: number, netGrams: number) => linesFor('manager', { cylinders: { late: found({ count: 2, withContents, netGrams, question: { finding: 'retest-overdue', lifecycle: 'in-service' } }) } })[0]!
    expect(late(1, 4536).reason).toMatch(/^1 of them still holds 10\.0\u00A0lb\./)
    expect(late(2, 0).reason).toMatch(/^2 of them still hold something\./)
    expect(late(0, 0).reason).toMatch(/^7K3 M9Q 2TX.*Empty/)
    expect(late(1, 4536)).toMatchObject({ kind: 'stop', to: '/fleet?finding=retest-overdue&lifecycle=in-service' })
  })

  it('that fall due name the month, and lead to the test lots', () => {
    expect(linesFor('warehouse', { cylinders: { soon: found({ count: 4, withContents: 1 }) } })[0]).toMatchObject({
      sentence: '4 retests fall due by the end of March 2027.', reason: '3 with nothing in them could go to the test station now.', to: '/retests',
    })
  })
})

describe('the custody log', () => {
  const check = (days: number, isOk = true) => linesFor('auditor', { logCheck: { last: { at: NOON - days * DAY, isOk }, newEvents: 5 } })

  it('is to be checked again on the seventh day', () => {
    expect(check(6)).toEqual([])
    expect(check(7)[0]).toMatchObject({ topic: 'log-unchecked', sentence: 'The custody log was last checked 7 days ago.', reason: 'It added up then. 5 lines were recorded since.', to: '/log' })
  })

  it('is to be checked where it never was, once something stands in it', () => {
    expect(linesFor('auditor', { logCheck: { last: null, newEvents: 0 } })).toEqual([])
    expect(linesFor('auditor', { logCheck: { last: null, newEvents: 1 } })[0]!.sentence).toBe('The custody log was never checked.')
  })

  it('stops the manager as well where it does not add up', () => {
    expect(check(0, false)[0]).toMatchObject({ topic: 'log-broken', kind: 'stop' })
    expect(linesFor('manager', { logCheck: { last: { at: NOON, isOk: false }, newEvents: 0 } })[0]).toMatchObject({ topic: 'log-broken' })
    expect(linesFor('manager', { logCheck: { last: null, newEvents: 9 } })).toEqual([])
  })

  it('names the cylinder of the newest correction', () => {
    const none = { count: 0, cylinders: 0, newest: null }
    const entries = { doubtful: none, late: none, corrected: { count: 3, cylinders: 2, newest: cylinderRow() } }
    expect(linesFor('auditor', { entries })).toEqual([expect.objectContaining({
      number: 3, sentence: '3 entries were corrected this week.', reason: expect.stringMatching(/^On 2 cylinders, the newest on 7K3 M9Q 2TX\./), to: '/c/7k3m9q2tx/log',
    })])
  })
})

describe('lists and records', () => {
  it('lead a single draft to itself, and several to the list of drafts', () => {
    const draft = (count: number) => linesFor('warehouse', { shipmentDrafts: { count, id: ID, number: 409, since: NOON - DAY } })[0]
    expect(draft(1)).toMatchObject({ sentence: '1 shipment is a draft still.', verb: 'Go on with it', to: `/shipments/${ID}` })
    expect(draft(2)).toMatchObject({ sentence: '2 shipments are drafts still.', to: '/shipments?state=draft' })
  })

  it('tell the manager of a shipment that is ready to leave, and nobody else', () => {
    const facts = { shipmentsReady: { count: 1, id: ID, number: 409, since: NOON - DAY } }
    expect(linesFor('manager', facts)[0]).toMatchObject({ sentence: '1 shipment is ready to leave.', verb: 'Send it off', to: `/shipments/${ID}` })
    expect(linesFor('manager', { shipmentsReady: { ...facts.shipmentsReady, count: 2 } })[0]).toMatchObject({ sentence: '2 shipments are ready to leave.', to: '/shipments?state=ready' })
    expect(linesFor('warehouse', facts)).toEqual([])
  })

  it('let the manager receive what the warehouse can only ask about', () => {
    const facts = { shipmentsAway: { count: 1, id: ID, number: 409, since: NOON - 8 * DAY } }
    expect(linesFor('manager', facts)[0]).toMatchObject({ verb: 'Settle it', reason: expect.stringContaining('left 8 days ago') })
    expect(linesFor('warehouse', facts)[0]).toMatchObject({ verb: 'Open it' })
  })

  it('tell the administrator what is missing, each by itself, and nothing where nothing is', () => {
    const missing = { shop: false, reclaimer: true, testStation: false, vansWithoutTechnician: ['Van 02', 'Van 05'] }
    expect(linesFor('admin', { missing, uncertified: ['Ines'], notTakenUp: [] }).map(({ topic, number }) => `${topic} ${number}`))
      .toEqual(['uncertified 1', 'no-reclaimer 1', 'vans-without-technician 2'])
    expect(linesFor('admin', { missing: { shop: false, reclaimer: false, testStation: false, vansWithoutTechnician: [] }, uncertified: [], notTakenUp: [] })).toEqual([])
  })
})

describe('what a van did not bring back', () => {
  const van = { id: ID, name: 'Van 12', names: ['7K3 M9Q 2TX', 'serial K1044'], checkedAt: NOON - DAY }

  it('names what is missing, and leads to that van', () => {
    expect(linesFor('warehouse', { shortVans: [van] })).toEqual([expect.objectContaining({
      kind: 'unk', number: 2, sentence: 'Van 12 came back 2 short.',
      reason: '7K3 M9Q 2TX and serial K1044 not found on Van 12 yesterday 12:00. Not seen since.', to: `/vans/${ID}`,
    })])
  })

  it('leads from several vans to all of them', () => {
    expect(linesFor('manager', { shortVans: [van, { ...van, name: 'Van 2', names: ['K7'] }] })[0]).toMatchObject({ number: 3, sentence: '2 vans came back 3 short.', to: '/vans' })
  })

  it('is no line where every van brought back all, and nothing of a technician\'s', () => {
    expect(linesFor('manager', { shortVans: [] })).toEqual([])
    expect(linesFor('technician', { shortVans: [van] })).toEqual([])
  })
})

describe('a shop with few empty cylinders', () => {
  it('says how many it has, also where it has none', () => {
    expect(linesFor('warehouse', { fewEmpty: [{ id: ID, name: 'North shop', count: 0 }] })).toEqual([expect.objectContaining({
      kind: 'att', number: 1, sentence: 'North shop has 0 empty cylinders that may be filled.', to: `/fleet?place=${ID}`,
    })])
  })

  it('stands with the others in one line', () => {
    expect(linesFor('manager', { fewEmpty: [{ id: ID, name: 'North shop', count: 1 }, { id: ID, name: 'South shop', count: 2 }] })[0]).toMatchObject({
      number: 2, sentence: '2 shops have few empty cylinders.', reason: expect.stringContaining('North shop 1 and South shop 2 that may be filled. Fewer than 3 leave'),
    })
  })
})

describe('a scale that was not checked within a year', () => {
  it('is named with its last check, for manager and administrator, and leads to where the next is written down', () => {
    for (const role of ['manager', 'admin'] as const) {
      expect(linesFor(role, { scaleChecks: [{ name: 'Floor scale', lastCheckOn: '2025-11-30' }] })).toEqual([expect.objectContaining({
        topic: 'scale-checks', kind: 'att', number: 1, sentence: '1 scale was not checked within a year.',
        reason: expect.stringMatching(/^Last check of Floor scale \(30 Nov 2025\)\./), to: '/scales',
      })])
    }
  })

  it('stands with one of which no check is known', () => {
    expect(linesFor('manager', { scaleChecks: [{ name: 'Bench', lastCheckOn: null }, { name: 'Floor scale', lastCheckOn: '2025-11-30' }] })[0]).toMatchObject({
      number: 2, reason: expect.stringContaining('Last check of Bench (not known) and Floor scale (30 Nov 2025).'), verb: 'See which',
    })
  })

  it('is no line where every scale was, and nothing of the warehouse\'s', () => {
    expect(linesFor('manager', { scaleChecks: [] })).toEqual([])
    expect(linesFor('warehouse', { scaleChecks: [{ name: 'Bench', lastCheckOn: null }] })).toEqual([])
  })
})

describe('what a trainee recorded and nobody has countersigned', () => {
  const cylinder = { id: ID, labelCode: '7K3M9Q2TX', serial: null }
  const mine = { supervisor: 'Tina', count: 2, cylinders: [cylinder] }

  it('waits for the supervisor it names, and leads to where it is signed', () => {
    expect(linesFor('technician', { toCountersign: mine })).toEqual([expect.objectContaining({
      topic: 'to-countersign', kind: 'att', number: 2, sentence: '2 entries of trainees wait for your signature.', verb: 'Read and sign them', to: '/countersign',
    })])
  })

  it('leads the manager to the log where it is all of one cylinder', () => {
    expect(linesFor('manager', { unsigned: [mine] })[0]).toMatchObject({ number: 2, to: '/c/7k3m9q2tx/log' })
  })

  it('is told to the manager by supervisor, and the cylinders are listed where there are several', () => {
    const nobodys = { supervisor: null, count: 1, cylinders: [{ id: 'other', labelCode: null, serial: 'K1044' }] }
    expect(linesFor('manager', { unsigned: [mine, nobodys] })).toEqual([expect.objectContaining({
      topic: 'unsigned', number: 3, sentence: '3 entries of trainees are not countersigned, on 2 cylinders.',
      reason: '2 with Tina and 1 without a supervisor. No total that the law asks for counts them.', verb: 'Show the 2 cylinders', to: '/fleet?finding=unsigned',
    })])
  })

  it('is no line where all is signed', () => {
    expect(linesFor('manager', { unsigned: [] })).toEqual([])
  })
})

describe('what came late', () => {
  it('is said to the manager with what it changed, and leads to the newest log', () => {
    const cylinder = cylinderRow()
    expect(linesFor('manager', { cameLate: { count: 1, lines: 3, cylinders: [cylinder] } })).toMatchObject([{
      topic: 'came-late', number: 1, sentence: '1 entry came late or was corrected, and 3 lines say something else since.', verb: 'See what changed', to: '/c/7k3m9q2tx/log',
    }])
    expect(linesFor('manager', { cameLate: { count: 0, lines: 0, cylinders: [] } })).toEqual([])
    expect(linesFor('warehouse', { cameLate: { count: 1, lines: 1, cylinders: [cylinder] } })).toEqual([])
  })

  it('names each shipment whose papers differ', () => {
    expect(linesFor('manager', { papersDiffer: [{ id: ID, number: 7, lines: 2 }] })).toMatchObject([{
      key: `papers-differ ${ID}`, sentence: 'The papers of shipment 0007 differ from the log.', to: `/shipments/${ID}`,
    }])
  })
})
