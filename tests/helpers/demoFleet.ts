import { randomUUID } from 'node:crypto'
import type { CustodyLogAnswer, CylinderRow, FleetAnswer } from '../../utils/contract/custody'
import type { NewDockLinkAnswer } from '../../utils/contract/dock'
import type { JobsAnswer } from '../../utils/contract/jobs'
import type { MintAnswer } from '../../utils/contract/labels'
import type { FirmsAnswer, PlacesAnswer } from '../../utils/contract/places'
import type { PlansAnswer } from '../../utils/contract/plans'
import type { ShipmentsAnswer, ShipmentState } from '../../utils/contract/shipments'
import type { TestLotsAnswer, TestLotState, TestLotWithLines } from '../../utils/contract/testLots'
import type { SessionAnswer } from '../../utils/contract/session'
import { handoverText } from '../../utils/handover/handoverText'
import { DEMO_PASSWORD } from '../../server/utils/demo/cast'
import { TestClient } from './client'
import { invitationToken } from './firm'
import { made } from './fleet'
import type { TestServer } from './server'

const PEOPLE = ['warehouse', 'technician', 'manager', 'auditor', 'admin', 'trainee'] as const
const LINES_OF_A_DRAFT = 3
const INVITED = { name: 'Nils Varga', email: 'nils@demo.example', roles: ['warehouse'] }

/** The demo firm as a test visits it: its people signed in, and addresses of what its pages can show. */
export interface DemoFleet {
  people: Record<(typeof PEOPLE)[number], TestClient>
  codes: Record<'usual' | 'empty' | 'overfilled' | 'onTwo' | 'onNone', string>
  /** The newest line of the usual cylinder. */
  event: string
  shipments: Record<ShipmentState, string>
  lots: Record<Exclude<TestLotState, 'cancelled'>, string>
  /** Tokens of links to the dock: of a shipment on its way, and of one that is settled. */
  docks: Record<'dispatched' | 'settled', string>
  /** The open plan. */
  plan: string
  /** The technician's van. */
  van: string
  reclaimer: string
  /** A customer with refrigerant banked, and a job of theirs whose note is in its second issue. */
  customer: string
  job: string
  invitation: string
  /** What the technician's phone shows to hand cylinders over. */
  offer: string
  setUpToken: string
}

/** Signs everybody of the demo firm in and looks its cylinders and papers up. */
export async function demoFleet(server: TestServer, setUpToken: string): Promise<DemoFleet> {
  const people = Object.fromEntries(await Promise.all(PEOPLE.map(async (name) => {
    const client = new TestClient(server.baseUrl)
    const answer = await client.signIn(`${name}@demo.example`, DEMO_PASSWORD)
    if (answer.status !== 200) throw new Error(`${name} could not sign in: ${JSON.stringify(answer.body)}`)
    return [name, client]
  }))) as DemoFleet['people']
  const { manager, admin, technician } = people
  const codeOf = async (query: string, fits: (row: CylinderRow) => boolean = () => true) => {
    const { items } = (await manager.get<FleetAnswer>(`/api/cylinders?limit=200${query}`)).body
    const found = items.find(row => row.labelCode !== null && fits(row))
    if (!found) throw new Error(`The demo firm has no labelled cylinder for ${query}`)
    return found.labelCode!.toLowerCase()
  }
  const usual = await codeOf('&lifecycle=in-service&refrigerant=R-22', row => row.worstFinding === null)
  const { codes: [onNone] } = await made<MintAnswer>(manager, '/api/labels', { count: 1 })
  const { items: events } = (await manager.get<CustodyLogAnswer>(`/api/cylinders/${usual}/events?limit=1`)).body
  const { items: places } = (await manager.get<PlacesAnswer>('/api/places')).body
  const van = places.find(({ technicianName }) => technicianName === 'Dayo Okafor')!.id
  const { items: jobs } = (await manager.get<JobsAnswer>('/api/jobs?limit=200')).body
  const job = jobs.find(({ equipment }) => equipment === 'Blast freezer')!
  const { items: [reclaimer] } = (await manager.get<FirmsAnswer>('/api/firms?kind=reclaimer')).body
  const { items: [plan] } = (await manager.get<PlansAnswer>('/api/plans')).body
  await made(admin, '/api/people', INVITED)
  const left = await firstOfEach<ShipmentsAnswer, Exclude<ShipmentState, 'draft'>>(manager, '/api/shipments', ['ready', 'dispatched', 'arrived', 'settled', 'closed', 'cancelled'])
  return {
    people, van, reclaimer: reclaimer!.id, plan: plan!.id, customer: job.customer.id!, job: job.id,
    codes: {
      usual, onNone: onNone!.toLowerCase(),
      empty: await codeOf('&lifecycle=in-service', row => row.nothingInIt && row.worstFinding === null),
      overfilled: await codeOf('&finding=overfill'),
      onTwo: await codeOf('&finding=code-on-two'),
    },
    event: events[0]!.id,
    shipments: {
      draft: await draft(manager, '/api/shipments', 'reclaimer'),
      ...left,
    },
    docks: { dispatched: await dockToken(manager, left.dispatched), settled: await dockToken(manager, left.settled) },
    lots: {
      draft: await draft(manager, '/api/test-lots', 'requalifier'),
      sent: await sentLot(manager),
      ...await firstOfEach<TestLotsAnswer, 'back'>(manager, '/api/test-lots', ['back']),
    },
    offer: handoverText({
      is: 'offer', id: '7K3M9Q2T', atMs: Date.now(), cylinders: [usual.toUpperCase(), onNone!],
      personId: (await technician.get<SessionAnswer>('/api/session')).body.user.id,
    }),
    invitation: await invitationToken({ client: admin }, INVITED.email),
    setUpToken,
  }
}

/** What opens a shipment to its dock. */
async function dockToken(client: TestClient, shipmentId: string): Promise<string> {
  const { url } = await made<NewDockLinkAnswer>(client, `/api/shipments/${shipmentId}/dock-links`, { id: randomUUID(), forWhom: 'Dock 2' })
  return new URL(url).pathname.slice('/d/'.length)
}

/** A new draft with the first cylinders of the fleet that may leave with it. */
async function draft(client: TestClient, path: '/api/shipments' | '/api/test-lots', kind: 'reclaimer' | 'requalifier'): Promise<string> {
  const [firm] = (await client.get<FirmsAnswer>(`/api/firms?kind=${kind}`)).body.items
  const { items } = (await client.get<FleetAnswer>('/api/cylinders?limit=200&lifecycle=in-service&sort=code')).body
  const { id } = await made<{ id: string }>(client, path, { [kind === 'reclaimer' ? 'toFirmId' : 'requalifierId']: firm?.id })
  const onIt: string[] = []
  for (const row of items) {
    const answer = await withLines(client, `${path}/${id}/lines`, onIt, [row.id])
    if (answer.status === 200 && answer.body.lines.at(-1)?.because.length === 0) onIt.push(row.id)
    else if (answer.status === 200) await withLines(client, `${path}/${id}/lines`, onIt, [], [row.id])
    if (onIt.length === LINES_OF_A_DRAFT) break
  }
  return id
}

/** Another cylinder onto a list, or one off it. */
function withLines(client: TestClient, path: string, standing: readonly string[], add: string[], takeOff: string[] = []) {
  if (path.startsWith('/api/test-lots')) return client.put<TestLotWithLines>(path, { cylinderIds: [...standing, ...add] })
  return client.patch<TestLotWithLines>(path, {
    occurredAt: new Date().toISOString(),
    add: add.map(cylinderId => ({ id: randomUUID(), cylinderId })),
    takeOff: takeOff.map(cylinderId => ({ id: randomUUID(), cylinderId, reason: 'It may not leave' })),
  })
}

/** A test lot that has just left. */
async function sentLot(client: TestClient): Promise<string> {
  const id = await draft(client, '/api/test-lots', 'requalifier')
  const { lines } = (await client.get<TestLotWithLines>(`/api/test-lots/${id}`)).body
  const answer = await client.post(`/api/test-lots/${id}/dispatch`, {
    occurredAt: new Date().toISOString(),
    lines: lines.map(({ cylinder, version }) => ({ cylinderId: cylinder.id, eventId: randomUUID(), expects: version })),
  })
  if (answer.status !== 200) throw new Error(`The dispatch answered ${answer.status}: ${JSON.stringify(answer.body)}`)
  return id
}

/** The id of the newest list of each state. */
async function firstOfEach<A extends { items: { id: string }[] }, S extends string>(client: TestClient, path: string, states: S[]): Promise<Record<S, string>> {
  const found = await Promise.all(states.map(async (state) => {
    const [first] = (await client.get<A>(`${path}?state=${state}&limit=1`)).body.items
    if (!first) throw new Error(`The demo firm has nothing at ${path} that is ${state}`)
    return [state, first.id]
  }))
  return Object.fromEntries(found) as Record<S, string>
}
