import type { InStatement } from '@libsql/client'
import { firm, firms, labels, openLines, people, places, scales, settings, shipmentLines, shipments, testLotLines, testLots } from '../../../drizzle/schema'
import { DEFAULT_FILL_POLICY } from '../../../utils/capacity/types'
import { readingGrams } from '../../../utils/quantity/mass'
import { stepGrams } from '../../../utils/quantity/scale'
import { statement, type Database } from '../database/database'
import { DAY, workingMorning } from './calendar'
import { DEMO_FIRM, type Cast } from './cast'
import type { DemoLot, DemoShipment, Stage } from './lives'
import { sentStates, type SentState } from './sentShipments'

const CAREFUL_DAYS = 150

/** The firm, its people, places and firms, its scales and rules. */
export function castTables({ read }: Database, cast: Cast, passwordHash: string, at: number, uuid: (ms: number) => string): InStatement[] {
  const created = { createdAt: at }
  return [
    statement(read.insert(firm).values({ id: uuid(at), ...DEMO_FIRM, ...created })),
    ...Object.values(cast.people).map(({ reads, ...one }) => statement(read.insert(people).values({ ...one, units: reads, passwordHash, active: true, ...created }))),
    ...Object.values(cast.firms).map(one => statement(read.insert(firms).values({ ...one, ...created }))),
    ...[...cast.shops, ...cast.racks, ...cast.firmPlaces, ...cast.vans, ...cast.sites].map(one => statement(read.insert(places).values({ ...one, ...created }))),
    ...Object.values(cast.scales).map(({ accuracyPercent, ...one }) => statement(read.insert(scales).values({
      ...one, accuracyGrams: stepGrams(one.accuracyEntered), accuracyBasisPoints: Math.round(accuracyPercent * 100),
    }))),
    ...firmRules(cast, at).map(rule => statement(read.insert(settings).values({ id: uuid(rule.fromAt), ...rule, setAt: rule.fromAt }))),
  ]
}

/** The fill rule of the first day, and the one that took its place once the scale was checked. */
function firmRules({ people: { manager } }: Cast, at: number): (Pick<typeof settings.$inferInsert, 'value' | 'reason' | 'setBy'> & { kind: 'fill-policy', fromAt: number })[] {
  const shared = { kind: 'fill-policy' as const, setBy: manager.id }
  return [
    { ...shared, fromAt: at, value: { ...DEFAULT_FILL_POLICY, shareThousandths: 780 }, reason: 'Careful until the shop scale has been checked against test weights.' },
    { ...shared, fromAt: workingMorning(at + CAREFUL_DAYS * DAY), value: DEFAULT_FILL_POLICY, reason: 'The shop scale was checked and reads true. The usual 80 % from here on.' },
  ]
}

/** The shipments and test lots that have left, as they stand at the story's end. */
export function listTables({ read }: Database, stage: Stage): InStatement[] {
  const sent = stage.shipments.filter(one => one.cylinders.length > 0)
  const lots = stage.lots.filter(one => one.cylinders.length > 0)
  const states = sentStates(sent, stage.endAt)
  return [
    ...sent.flatMap((one, index) => shipmentRows(read, stage, { ...one, ...states[index]! }, index + 1)),
    ...lots.flatMap((one, index) => lotRows(read, stage, one, index + 1)),
  ]
}

function shipmentRows(read: Database['read'], { cast }: Stage, one: DemoShipment & SentState, number: number): InStatement[] {
  const { state, arrivedAt, settledAt, closedAt } = one
  return [
    statement(read.insert(shipments).values({
      id: one.id, number, toFirmId: cast.firms[one.to].id, state, createdAt: one.at, createdBy: cast.people.warehouse.id,
      dispatchedAt: one.at, dispatchedBy: cast.people.manager.id, arrivedAt, settledAt, closedAt,
    })),
    ...one.cylinders.flatMap(({ steel, gross, refrigerant, netGrams }, position) => [
      statement(read.insert(shipmentLines).values({
        shipmentId: one.id, cylinderId: steel.id, position,
        sent: { gross, grossGrams: readingGrams(gross), refrigerant, condition: 'clean', netGrams },
      })),
      ...(settledAt !== null ? [] : [statement(read.insert(openLines).values({ cylinderId: steel.id, listKind: 'shipment', listId: one.id }))]),
    ]),
  ]
}

function lotRows(read: Database['read'], { cast, endAt }: Stage, one: DemoLot, number: number): InStatement[] {
  const isBack = one.backAt <= endAt
  return [
    statement(read.insert(testLots).values({
      id: one.id, number, requalifierId: cast.firms.requalifier.id, state: isBack ? 'back' : 'sent', createdAt: one.at, createdBy: cast.people.warehouse.id,
      sentAt: one.at, sentBy: cast.people.manager.id, backAt: isBack ? one.backAt : null,
    })),
    ...one.cylinders.flatMap((steel, position) => [
      statement(read.insert(testLotLines).values({ lotId: one.id, cylinderId: steel.id, position })),
      ...(isBack ? [] : [statement(read.insert(openLines).values({ cylinderId: steel.id, listKind: 'test-lot', listId: one.id }))]),
    ]),
  ]
}

/** Every code on a cylinder was minted, and ten more lie printed in the shop. */
export function labelTables({ read }: Database, stage: Stage, used: readonly string[], blank: readonly string[]): InStatement[] {
  return [...new Set([...used, ...blank])].map(code => statement(read.insert(labels).values({
    code, mintedAt: stage.startAt, mintedBy: stage.cast.people.warehouse.id,
  }).onConflictDoNothing()))
}
