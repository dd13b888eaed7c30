import { addMonths } from '../../../utils/quantity/month'
import { DAY, HOUR, MINUTE, workingTime } from './calendar'
import type { Cast, DemoPerson } from './cast'
import type { Random } from './random'
import type { Script } from './script'
import { limitOf, newSteel, pounds, weigh, type Steel, type SteelSize } from './steel'

/** A line of a shipment as it left. */
export interface DemoLine { steel: Steel, gross: ReturnType<typeof weigh>, refrigerant: string | null, netGrams: number }

/** A dispatch that the demo's lives come together in. */
export interface DemoShipment { id: string, at: number, backAt: number, to: 'reclaimer' | 'otherReclaimer', cylinders: DemoLine[] }
/** A test lot that the demo's lives come together in. */
export interface DemoLot { id: string, at: number, backAt: number, cylinders: Steel[] }

/** What the lives of cylinders are written with. */
export interface Stage {
  random: Random
  cast: Cast
  script: Script
  startAt: number
  endAt: number
  shipments: DemoShipment[]
  lots: DemoLot[]
  /** Who supervises the trainee. */
  supervisor: DemoPerson
}

const MIX: [refrigerant: string, size: SteelSize, count: number][] = [
  ['R-410A', 'small', 24], ['R-410A', 'middle', 28], ['R-410A', 'large', 4],
  ['R-22', 'middle', 15], ['R-22', 'low', 9], ['R-22', 'large', 3],
  ['R-134a', 'small', 12], ['R-134a', 'low', 5], ['R-404A', 'middle', 12], ['R-407C', 'middle', 9],
  ['R-448A', 'small', 4], ['R-32', 'small', 6], ['R-454B', 'small', 5],
]

/** The everyday lives of the fleet: registered, taken out, filled, brought back, shipped, tested, and again. */
export function playLives(stage: Stage): Steel[] {
  return MIX.flatMap(([refrigerant, size, count]) => Array.from({ length: count }, () => playLife(stage, refrigerant, size)))
}

function playLife(stage: Stage, refrigerant: string, size: SteelSize): Steel {
  const { random, cast, startAt, endAt } = stage
  const flammable = refrigerant === 'R-32' || refrigerant === 'R-454B'
  const steel = newSteel(random, startAt, size, { flammableMarked: flammable })
  let at = workingTime(startAt, random.chance(0.8) ? random.between(0, 40) : random.between(40, 400), random)
  const shop = random.pick(cast.racks)
  registerAt(stage, steel, at, shop.id, random.chance(0.7) ? refrigerant : undefined)
  while (at < endAt - 3 * DAY) {
    if (dueSoon(steel, at) && steel.netGrams === 0 && random.chance(0.85)) {
      const back = joinLot(stage, steel, at, shop.id)
      if (back === null) return steel
      at = back
      continue
    }
    const out = takeOut(stage, steel, refrigerant, at)
    if (out === 'stays') return countLately(stage, steel, at, shop.id)
    if (out === null) return steel
    at = bringBack(stage, steel, out, shop.id)
    if (at > endAt) return steel
    if (steel.netGrams > limitOf(steel, refrigerant) * 0.82) {
      if (!stage.shipments.some(one => one.at > at + DAY)) return countLately(stage, steel, at, shop.id)
      const back = ship(stage, steel, at, shop.id)
      if (back === null) return steel
      at = back
    }
    at = workingTime(at, random.between(1, 20), random)
  }
  return steel
}

/** The warehouse's count: most of what stands idle at the story's end was on the scale within the last weeks. */
function countLately(stage: Stage, steel: Steel, since: number, shopId: string): Steel {
  const { random, script, cast, endAt } = stage
  const at = workingTime(endAt, -random.between(3, 24), random)
  if (at > since + 2 * DAY && random.chance(0.85)) script.add(cast.people.warehouse, at, steel.id, 'weighed', { gross: weigh(steel, 'lb'), scaleId: scaleAt(stage, shopId) }, { placeId: shopId })
  return steel
}

/** The scale of a shop. */
function scaleAt({ cast: { shops, scales } }: Stage, shopId: string): string {
  return shopId === shops[0].id ? scales.shop.id : scales.south.id
}

/** Registered from the stamp and labelled within the quarter of an hour. */
export function registerAt(stage: Stage, steel: Steel, at: number, placeId: string, dedicatedTo?: string): void {
  const { script, cast } = stage
  script.add(cast.people.warehouse, at, steel.id, 'registered', {
    stamp: steel.stamp,
    marks: [{ month: steel.testedMonth, rin: 'Z987' }],
    ownership: 'own',
    ...(dedicatedTo ? { dedicatedTo } : {}),
    contents: 'evacuated',
    gross: weigh(steel, 'lb'),
  }, { placeId, lateMs: 2 * MINUTE })
  script.add(cast.people.warehouse, at + 9 * MINUTE, steel.id, 'labelled', { code: steel.code }, { placeId, lateMs: 2 * MINUTE })
}

/** Onto a van and filled on a few jobs; it stays, or is still out (null), where the story's end comes first. */
function takeOut(stage: Stage, steel: Steel, refrigerant: string, from: number): { at: number, by: DemoPerson } | 'stays' | null {
  const { random, script, cast, endAt } = stage
  const by = random.chance(0.03) ? cast.people.trainee : random.pick([cast.people.technician, cast.people.second, cast.people.third])
  const van = cast.vans.find(one => one.technicianId === by.id)!
  const signed = by.trainee ? { supervisorId: stage.supervisor.id } : {}
  let at = workingTime(from, random.between(2, 24), random)
  if (at > endAt) return 'stays'
  script.add(by, at, steel.id, 'moved', { toPlaceId: van.id, toHolderId: by.id }, signed)
  const limit = limitOf(steel, refrigerant)
  for (let job = random.whole(1, 4); job > 0; job--) {
    at = workingTime(at, random.between(1, 6), random)
    if (at > endAt) return null
    const room = limit - steel.netGrams
    if (room < pounds(1.5)) break
    const grossBefore = weigh(steel, by.reads)
    const amount = Math.min(room - pounds(0.2), pounds(random.between(2.2, steel.stamp.servicePressurePsig === 400 ? 13 : 16)))
    steel.netGrams += amount
    steel.refrigerant = refrigerant
    const customer = random.chance(0.01) ? { ownerOfRefrigerantId: cast.firms.dairy.id } : {}
    script.add(by, at, steel.id, 'filled', {
      refrigerant, ...(random.chance(0.9) ? { condition: 'clean' as const } : { condition: 'suspect' as const }),
      grossBefore, grossAfter: weigh(steel, by.reads), method: 'machine', looked: true, ...customer,
    }, { ...signed, placeId: random.pick([...cast.sites, van]).id })
    if (random.chance(0.07)) drawBack(stage, steel, by, at + 2 * HOUR, signed)
  }
  if (random.chance(0.12)) script.add(by, at + HOUR, steel.id, 'handed-over', { toHolderId: random.pick([cast.people.second, cast.people.third]).id }, signed)
  return { at, by }
}

function drawBack(stage: Stage, steel: Steel, by: DemoPerson, at: number, signed: { supervisorId?: string }): void {
  const { random, script, endAt } = stage
  if (at > endAt || steel.netGrams < pounds(4)) return
  steel.netGrams -= Math.min(steel.netGrams - pounds(1), pounds(random.between(1, 4)))
  script.add(by, at, steel.id, 'drawn', { grossAfter: weigh(steel, by.reads), purpose: 'same-system', phase: 'liquid' }, signed)
}

/** Back at the shop, mostly weighed there; answers when. */
function bringBack(stage: Stage, steel: Steel, out: { at: number, by: DemoPerson }, shopId: string): number {
  const { random, script, cast, endAt } = stage
  const at = workingTime(out.at, random.between(1, 9), random)
  if (at > endAt) return at
  const signed = out.by.trainee ? { supervisorId: stage.supervisor.id } : {}
  script.add(out.by, at, steel.id, 'moved', { toPlaceId: shopId }, signed)
  if (random.chance(0.45) && at + 3 * HOUR < endAt) script.add(cast.people.warehouse, at + 3 * HOUR, steel.id, 'weighed', { gross: weigh(steel, 'lb'), scaleId: scaleAt(stage, shopId) }, { placeId: shopId })
  return at
}

/** On the next shipment, and back evacuated some weeks later; null where it is still away at the story's end. */
function ship(stage: Stage, steel: Steel, from: number, shopId: string): number | null {
  const { random, script, cast, endAt } = stage
  const shipment = stage.shipments.find(one => one.at > from + DAY && one.cylinders.length < 24)
  if (!shipment) return null
  const gross = weigh(steel, 'lb')
  shipment.cylinders.push({ steel, gross, refrigerant: steel.refrigerant, netGrams: steel.netGrams })
  const { manager, warehouse } = cast.people
  const to = cast.firms[shipment.to]
  script.add(manager, shipment.at, steel.id, 'sent-for-reclaim', { shipmentId: shipment.id, gross }, { dispatchId: shipment.id, lateMs: MINUTE, placeId: cast.placeOf(to).id })
  if (shipment.backAt > endAt) return null
  script.add(manager, shipment.backAt, steel.id, 'reclaimed', {
    shipmentId: shipment.id, theirGross: weigh(steel, 'lb'), grade: random.chance(0.9) ? 'clean' : 'mixed',
    acceptedNet: { unit: 'lb', value: Math.round(steel.netGrams / pounds(1) * 10 - random.between(0, 4)) / 10 }, price: 2.4, pricePer: 'lb',
  }, { decides: true, lateMs: 20 * MINUTE })
  steel.netGrams = 0
  steel.refrigerant = null
  const back = workingTime(shipment.backAt, 3, random)
  if (back > endAt) return null
  script.add(warehouse, back, steel.id, 'returned', { fromFirmId: to.id, gross: weigh(steel, 'lb') }, { placeId: shopId })
  return evacuate(stage, steel, back + 2 * HOUR)
}

function evacuate(stage: Stage, steel: Steel, at: number): number | null {
  if (at > stage.endAt) return null
  stage.script.add(stage.cast.people.warehouse, at, steel.id, 'emptied', {
    grossAfter: weigh(steel, 'lb'), vacuum: { microns: stage.random.whole(3, 9) * 100 },
  })
  return at
}

function dueSoon(steel: Steel, at: number): boolean {
  return addMonths(steel.testedMonth, 60 - 3) <= new Date(at).toISOString().slice(0, 7)
}

/** To the test station with the next lot, back passed and wet, evacuated; null where it is still away at the end. */
function joinLot(stage: Stage, steel: Steel, from: number, shopId: string): number | null {
  const { random, script, cast, endAt } = stage
  const lot = stage.lots.find(one => one.at > from + DAY && one.cylinders.length < 12)
  if (!lot) return null
  lot.cylinders.push(steel)
  const { manager, warehouse } = cast.people
  script.add(manager, lot.at, steel.id, 'sent-for-test', { lotId: lot.id }, { dispatchId: lot.id, lateMs: MINUTE, placeId: cast.placeOf(cast.firms.requalifier).id })
  if (lot.backAt > endAt) return null
  const month = new Date(lot.backAt - 4 * DAY).toISOString().slice(0, 7)
  steel.testedMonth = month
  const { id: requalifierId, rin } = cast.firms.requalifier
  script.add(manager, lot.backAt, steel.id, 'retested', { month, method: 'volumetric', result: 'passed', requalifierId, rin }, { lateMs: 30 * MINUTE })
  script.add(warehouse, lot.backAt + HOUR, steel.id, 'returned', { fromFirmId: cast.firms.requalifier.id, gross: weigh(steel, 'lb') }, { placeId: shopId })
  return evacuate(stage, steel, workingTime(lot.backAt + HOUR, random.between(0, 3), random) + 6 * HOUR)
}
