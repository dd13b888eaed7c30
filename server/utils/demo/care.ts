import { DAY, HOUR, MINUTE } from './calendar'
import { daysAgo, fill, made } from './incidents'
import type { Stage } from './lives'

/** Cylinders that were looked over, set apart, missed and found again. */
export function playCare(stage: Stage): void {
  looks(stage)
  apart(stage)
  missed(stage)
  ended(stage)
}

/** A supervisor reads what the trainee recorded, within two days; what is of this week still waits. */
export function playSignatures({ script, random, endAt, supervisor }: Stage): void {
  const waits = script.events.filter(({ author, body, recordedAt }) => author.trainee && body.supervisorId === supervisor.id && recordedAt < endAt - 6 * DAY)
  for (const { id, cylinderId, recordedAt } of waits) {
    script.add(supervisor, recordedAt + random.whole(2, 44) * HOUR, cylinderId, 'countersigned', { eventId: id }, { lateMs: MINUTE })
  }
}

function looks(stage: Stage): void {
  const { script, cast } = stage
  const { second, third, warehouse } = cast.people
  const dented = made(stage, 6).steel
  fill(stage, dented, { refrigerant: 'R-22', pounds: 6, days: 38 })
  script.add(warehouse, daysAgo(stage, 29), dented.id, 'inspected', { result: 'damaged', reasons: ['dent', 'corrosion'] }, { note: 'dent at the foot ring, a hand wide' })
  const sound = made(stage, 6).steel
  script.add(third, daysAgo(stage, 9), sound.id, 'inspected', { result: 'sound' })
  script.add(second, daysAgo(stage, 8), made(stage, 5, 'small').steel.id, 'inspected', { result: 'damaged', reasons: ['valve'] })
}

function apart(stage: Stage): void {
  const { script, cast } = stage
  const { second, warehouse, manager } = cast.people
  const held = made(stage, 5).steel
  fill(stage, held, { refrigerant: 'R-410A', pounds: 12, days: 21 })
  script.add(second, daysAgo(stage, 15), held.id, 'quarantined', { reason: 'smells burnt, waits for the identifier' })
  script.add(warehouse, daysAgo(stage, 14), held.id, 'quarantined', { reason: 'oil at the valve' })
  script.add(warehouse, daysAgo(stage, 14) + HOUR, held.id, 'moved', { toPlaceId: cast.racks[2]!.id })
  const cleared = made(stage, 5).steel
  fill(stage, cleared, { refrigerant: 'R-134a', pounds: 10, days: 36 })
  script.add(warehouse, daysAgo(stage, 32), cleared.id, 'quarantined', { reason: 'label half torn off, contents doubted' }, { lateMs: 5 * MINUTE })
  script.add(manager, daysAgo(stage, 30), cleared.id, 'released', { reason: 'identifier read R-134a, label is on again' }, { decides: true, lateMs: 3 * MINUTE })
}

function ended(stage: Stage): void {
  const { script, cast, random } = stage
  const { manager, warehouse } = cast.people
  const old = made(stage, 9).steel
  script.add(warehouse, daysAgo(stage, 70), old.id, 'inspected', { result: 'damaged', reasons: ['crack'] }, { lateMs: 5 * MINUTE })
  script.add(manager, daysAgo(stage, 66), old.id, 'retired', {
    reason: 'cracked at the collar weld, not worth a repair', proof: { text: 'valve out, hole drilled, handed to the scrap yard', certificate: `S-${random.whole(1000, 9999)}` },
  }, { decides: true, lateMs: 5 * MINUTE })
  const gone = made(stage, 11, 'small').steel
  script.add(warehouse, daysAgo(stage, 140), gone.id, 'missing', {}, { lateMs: 5 * MINUTE })
  script.add(manager, daysAgo(stage, 47), gone.id, 'retired', { reason: 'not found in a quarter of a year, written off' }, { decides: true, lateMs: 5 * MINUTE })
  const used = made(stage, 9).steel
  script.add(manager, daysAgo(stage, 61), used.id, 'retired', { reason: 'given up with the old valves' }, { decides: true, lateMs: 5 * MINUTE })
  fill(stage, used, { refrigerant: 'R-22', pounds: 3, days: 27, options: { confirmed: ['after-end'] } })
}

function missed(stage: Stage): void {
  const { script, cast } = stage
  const { technician, third, warehouse } = cast.people
  const gone = made(stage, 7).steel
  fill(stage, gone, { by: 'third', refrigerant: 'R-410A', pounds: 8, days: 64 })
  script.add(warehouse, daysAgo(stage, 26), gone.id, 'missing', { lastSeen: 'on the roof of the cold store, after the job two months ago' })
  const back = made(stage, 6).steel
  const missedAt = daysAgo(stage, 45)
  script.add(warehouse, missedAt, back.id, 'missing', {}, { lateMs: 6 * MINUTE })
  script.add(third, missedAt + 3 * DAY, back.id, 'found', { placeId: cast.racks[3]!.id }, { lateMs: 6 * MINUTE })
  const used = made(stage, 6).steel
  script.add(warehouse, daysAgo(stage, 24), used.id, 'missing', { lastSeen: 'lent to the creamery' }, { lateMs: 8 * MINUTE })
  const van = cast.vans.find(({ technicianId }) => technicianId === technician.id)!
  script.add(technician, daysAgo(stage, 19), used.id, 'moved', { toPlaceId: van.id, toHolderId: technician.id }, { lateMs: 8 * MINUTE })
}
