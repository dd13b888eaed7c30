import { DAY, HOUR, MINUTE, monthFrom, workingTime } from './calendar'
import { registerAt, type Stage } from './lives'
import { limitOf, newSteel, pounds, shown, weigh, type Steel, type SteelSize } from './steel'

/** The things that go wrong in a year and a half: each of them once at least, and each with its finding in the log. */
export function playIncidents(stage: Stage): void {
  fills(stage)
  wrongSteel(stage)
  dates(stage)
  tests(stage)
  records(stage)
  people(stage)
  methods(stage)
}

/** A cylinder that was registered some months ago, ready for what happens to it. */
export function made(stage: Stage, monthsAgo: number, size: SteelSize = 'middle', more: Parameters<typeof newSteel>[3] = {}): { steel: Steel, at: number } {
  const at = workingTime(stage.endAt, -30 * monthsAgo, stage.random)
  const steel = newSteel(stage.random, at, size, { testedMonthsAgo: 14, ...more })
  registerAt(stage, steel, at, stage.cast.racks[1]!.id)
  return { steel, at }
}

/** A time of work some days before the demo ends. */
export function daysAgo(stage: Stage, days: number): number {
  return workingTime(stage.endAt, -days, stage.random)
}

interface FillOptions { by?: 'technician' | 'second' | 'third' | 'trainee', refrigerant: string | null, pounds: number, days: number, more?: object, options?: object, noLook?: boolean }

/** A recovery into a cylinder of the demo; when it was done. */
export function fill(stage: Stage, steel: Steel, one: FillOptions): number {
  const by = stage.cast.people[one.by ?? 'second']
  const at = daysAgo(stage, one.days)
  const grossBefore = weigh(steel, by.reads)
  steel.netGrams += pounds(one.pounds)
  steel.refrigerant = one.refrigerant
  stage.script.add(by, at, steel.id, 'filled', {
    refrigerant: one.refrigerant, grossBefore, grossAfter: weigh(steel, by.reads), method: 'machine',
    ...(one.noLook ? {} : { looked: true as const }), ...one.more,
  }, { placeId: stage.cast.sites[0]!.id, ...one.options })
  return at
}

function fills(stage: Stage): void {
  const { cast, script } = stage
  const over = made(stage, 5).steel
  fill(stage, over, { refrigerant: 'R-410A', pounds: 30, days: 20 })
  const room = limitOf(over, 'R-410A') - over.netGrams
  fill(stage, over, { refrigerant: 'R-410A', pounds: room / pounds(1) + 0.7, days: 2, options: { confirmed: ['overfill'] } })

  const nearly = made(stage, 5).steel
  fill(stage, nearly, { refrigerant: 'R-22', pounds: limitOf(nearly, 'R-22') / pounds(1) - 0.4, days: 9 })

  const second = made(stage, 4).steel
  fill(stage, second, { refrigerant: 'R-410A', pounds: 9, days: 50 })
  fill(stage, second, { refrigerant: 'R-22', pounds: 4, days: 12, options: { confirmed: ['second-refrigerant'] } })

  const unknown = made(stage, 4).steel
  fill(stage, unknown, { refrigerant: 'R-134a', pounds: 8, days: 44 })
  fill(stage, unknown, { refrigerant: null, pounds: 3, days: 10, more: { condition: 'unknown' } })

  const mystery = made(stage, 3, 'small').steel
  fill(stage, mystery, { refrigerant: null, pounds: 12.6, days: 22, more: { condition: 'unknown' } })
  script.add(cast.people.second, daysAgo(stage, 21), mystery.id, 'moved', { toPlaceId: cast.racks[2]!.id })

  const owners = made(stage, 3).steel
  fill(stage, owners, { refrigerant: 'R-404A', pounds: 11, days: 30, more: { ownerOfRefrigerantId: cast.firms.dairy.id } })
  fill(stage, owners, { refrigerant: 'R-404A', pounds: 6, days: 16 })

  const unlooked = made(stage, 3).steel
  fill(stage, unlooked, { refrigerant: 'R-407C', pounds: 10, days: 8, noLook: true })

  const burnt = made(stage, 4).steel
  fill(stage, burnt, { refrigerant: 'R-22', pounds: 12, days: 26, more: { condition: 'burnt' } })

  const leaked = made(stage, 6).steel
  fill(stage, leaked, { refrigerant: 'R-22', pounds: 14, days: 40 })
  leaked.netGrams -= pounds(3)
  script.add(cast.people.warehouse, daysAgo(stage, 25), leaked.id, 'lost', { cause: 'leak', grossAfter: weigh(leaked, 'lb') })
  const vented = made(stage, 6).steel
  fill(stage, vented, { refrigerant: 'R-134a', pounds: 9, days: 33 })
  script.add(cast.people.second, daysAgo(stage, 18), vented.id, 'lost', { cause: 'hose' })
}

function wrongSteel(stage: Stage): void {
  const { cast, script } = stage
  fill(stage, made(stage, 5, 'low').steel, { refrigerant: 'R-410A', pounds: 9, days: 15 })
  fill(stage, made(stage, 5, 'small').steel, { refrigerant: 'R-32', pounds: 7, days: 14 })
  fill(stage, made(stage, 5, 'middle', { flammableMarked: true }).steel, { refrigerant: 'R-717', pounds: 8, days: 19 })
  fill(stage, made(stage, 5, 'low').steel, { refrigerant: 'R-123', pounds: 16, days: 11 })
  const disposable = newSteel(stage.random, daysAgo(stage, 100), 'small', {
    spec: 'DOT-39', servicePressurePsig: 260, tareWeight: { unit: 'lb', value: 6.1 }, waterCapacity: { unit: 'lb', value: 29.8 }, madeMonth: monthFrom(stage.endAt, -20),
  })
  registerAt(stage, disposable, daysAgo(stage, 100), cast.racks[2]!.id)
  fill(stage, disposable, { refrigerant: 'R-134a', pounds: 6, days: 28 })
  const unread = newSteel(stage.random, daysAgo(stage, 70), 'middle', { tareWeight: null, serial: null, serialUnreadable: true })
  script.add(cast.people.warehouse, daysAgo(stage, 70), unread.id, 'registered', { stamp: unread.stamp, ownership: 'rental', ownerId: cast.firms.supplier.id, contents: 'unknown' }, { placeId: cast.racks[2]!.id })
}

function dates(stage: Stage): void {
  const { cast, script } = stage
  made(stage, 9, 'middle', { testedMonthsAgo: 54 })
  const kept = made(stage, 10, 'small', { testedMonthsAgo: 53 }).steel
  fill(stage, kept, { refrigerant: 'R-134a', pounds: 6.2, days: 150 })
  script.add(cast.people.second, daysAgo(stage, 4), kept.id, 'weighed', { gross: weigh(kept, 'lb') })
  const late = made(stage, 10, 'middle', { testedMonthsAgo: 54 }).steel
  fill(stage, late, { refrigerant: 'R-410A', pounds: 5, days: 6, options: { confirmed: ['retest-overdue'] } })
  made(stage, 2, 'middle', { testedMonthsAgo: 56 })
  const undated = newSteel(stage.random, daysAgo(stage, 50), 'middle', { madeMonth: null })
  script.add(cast.people.warehouse, daysAgo(stage, 50), undated.id, 'registered', { stamp: undated.stamp, ownership: 'own', contents: 'evacuated' }, { placeId: cast.racks[0]!.id })
  script.add(cast.people.warehouse, daysAgo(stage, 50) + HOUR, undated.id, 'labelled', { code: undated.code })
  // Not seen for 41 and for 95 days: what they were left with is what they were registered with.
  for (const days of [41, 95]) {
    const left = newSteel(stage.random, daysAgo(stage, days + 40), 'middle', { testedMonthsAgo: 9 })
    registerAt(stage, left, daysAgo(stage, days + 40), cast.racks[3]!.id)
    script.add(cast.people.third, daysAgo(stage, days), left.id, 'moved', { toPlaceId: cast.vans[2]!.id, toHolderId: cast.people.third.id }, { lateMs: 4 * MINUTE })
  }
}

function tests(stage: Stage): void {
  const { cast, script } = stage
  const { manager, warehouse } = cast.people
  const { id: requalifierId, rin } = cast.firms.requalifier
  const retest = (steel: Steel, days: number, result: 'passed' | 'rejected' | 'condemned', more: object = {}) =>
    script.add(manager, daysAgo(stage, days), steel.id, 'retested', { month: monthFrom(daysAgo(stage, days), 0), method: 'volumetric', result, requalifierId, ...more }, { lateMs: 10 * MINUTE })
  retest(made(stage, 8).steel, 5, 'passed', { rin })
  retest(made(stage, 8).steel, 34, 'rejected')
  const condemned = made(stage, 8).steel
  retest(condemned, 60, 'condemned')
  script.add(warehouse, daysAgo(stage, 31), condemned.id, 'moved', { toPlaceId: cast.racks[2]!.id })
  const full = made(stage, 8).steel
  fill(stage, full, { refrigerant: 'R-22', pounds: 13, days: 72 })
  retest(full, 35, 'passed', { rin })
  const lighter = made(stage, 8).steel
  retest(lighter, 45, 'passed', { rin, newTare: shown(lighter.tareGrams - pounds(0.4), 'lb') })
  lighter.tareGrams -= pounds(0.4)
  script.add(warehouse, daysAgo(stage, 43), lighter.id, 'emptied', { grossAfter: weigh(lighter, 'lb'), vacuum: { inHg: 29.4 } })
}

function records(stage: Stage): void {
  const { cast, script, random } = stage
  const { warehouse, manager, second } = cast.people
  const twice = made(stage, 4)
  script.add(warehouse, twice.at + 2 * DAY, twice.steel.id, 'registered', { stamp: twice.steel.stamp, ownership: 'own', contents: 'evacuated' })
  const noName = newSteel(random, daysAgo(stage, 13), 'middle')
  script.add(second, daysAgo(stage, 13), noName.id, 'weighed', { gross: shown(noName.tareGrams + pounds(6), 'lb') })
  const first = made(stage, 3)
  const other = made(stage, 3)
  script.add(warehouse, daysAgo(stage, 40), other.steel.id, 'labelled', { code: first.steel.code, reason: 'stuck on from the wrong sheet' })
  const light = made(stage, 3).steel
  script.add(warehouse, daysAgo(stage, 17), light.id, 'weighed', { gross: shown(light.tareGrams - pounds(2), 'lb') }, { confirmed: ['weigh-again'] })
  const ahead = made(stage, 3).steel
  fill(stage, ahead, { refrigerant: 'R-22', pounds: 5, days: 7, options: { clockAheadMs: 2 * DAY } })
  const away = made(stage, 12).steel
  fill(stage, away, { refrigerant: 'R-22', pounds: 20, days: 90 })
  const shipment = stage.shipments.at(-1)!
  const gross = weigh(away, 'lb')
  shipment.cylinders.push({ steel: away, gross, refrigerant: away.refrigerant, netGrams: away.netGrams })
  script.add(manager, shipment.at, away.id, 'sent-for-reclaim', { shipmentId: shipment.id, gross }, { dispatchId: shipment.id, lateMs: MINUTE, placeId: cast.placeOf(cast.firms[shipment.to]).id })
  script.add(warehouse, shipment.at + 2 * DAY, away.id, 'moved', { toPlaceId: cast.racks[0]!.id })
  const mistyped = made(stage, 3).steel
  const wrong = script.add(warehouse, daysAgo(stage, 23), mistyped.id, 'weighed', { gross: { unit: 'lb', value: 72.9 } })
  script.add(manager, daysAgo(stage, 22), mistyped.id, 'corrected', { eventId: wrong, reason: 'typed 72.9 for 27.9', instead: { gross: { unit: 'lb', value: 27.9 } } }, { decides: true })
  const relabelled = made(stage, 7).steel
  const fresh = newSteel(random, stage.endAt, 'middle').code
  script.add(warehouse, daysAgo(stage, 48), relabelled.id, 'labelled', { code: fresh, replaces: relabelled.code, reason: 'scraped off on a roof' })
  const bought = newSteel(random, daysAgo(stage, 80), 'small', { testedMonthsAgo: 20 })
  bought.netGrams = pounds(9)
  script.add(warehouse, daysAgo(stage, 80), bought.id, 'registered', {
    stamp: bought.stamp, ownership: 'customer', ownerId: cast.firms.store.id, contents: { refrigerant: 'R-134a', condition: 'clean' }, gross: weigh(bought, 'lb'),
  }, { placeId: cast.racks[3]!.id })
  script.add(warehouse, daysAgo(stage, 79), bought.id, 'received', { fromFirmId: cast.firms.store.id, gross: weigh(bought, 'lb'), paper: 'delivery note 311' }, { placeId: cast.racks[3]!.id })
}

function people(stage: Stage): void {
  const { script, cast } = stage
  const signed = made(stage, 3).steel
  fill(stage, signed, { by: 'trainee', refrigerant: 'R-410A', pounds: 7, days: 3, options: { supervisorId: stage.supervisor.id } })
  const alone = made(stage, 3).steel
  fill(stage, alone, { by: 'trainee', refrigerant: 'R-134a', pounds: 4, days: 13 })
  const bench = made(stage, 5, 'small').steel
  fill(stage, bench, { by: 'trainee', refrigerant: 'R-134a', pounds: 3, days: 27, options: { practice: true, supervisorId: stage.supervisor.id, note: 'bench exercise' } })
  script.add(cast.people.trainee, daysAgo(stage, 27) + HOUR, bench.id, 'weighed', { gross: weigh(bench, 'lb') }, { practice: true, supervisorId: stage.supervisor.id })
}

function methods(stage: Stage): void {
  fill(stage, made(stage, 4).steel, { refrigerant: 'R-22', pounds: 17, days: 24, more: { method: 'own-compressor' } })
  fill(stage, made(stage, 4).steel, { refrigerant: 'R-134a', pounds: 28, days: 17, more: { method: 'push-pull' } })
}
