import { createHash } from 'node:crypto'
import { setImmediate as nextTurn } from 'node:timers/promises'
import type { MassReading } from '../../utils/quantity/mass'
import type { AnyRecordedEvent } from '../../utils/custody/event'
import { fold } from '../../utils/custody/fold'
import type { CylinderState } from '../../utils/custody/state'
import { drawLabelCode } from '../../utils/label/code'
import { openDatabase } from '../../server/utils/database/database'
import { did, filled, FOLD_CONTEXT, recorded, registered, type Told } from './custody'
import { fillFleet, type FleetSetting } from './fleetRows'

const MINUTE = 60_000
const ROWS_AT_ONCE = 500
const REFRIGERANTS = ['R-410A', 'R-22', 'R-134a', 'R-404A', 'R-407C', 'R-32'] as const
const STEEL = [
  { spec: 'DOT-4BA', psig: 400, tares: 27, capacity: 47.7 }, { spec: 'DOT-4BA', psig: 260, tares: 17, capacity: 26.2 }, { spec: 'DOT-4BW', psig: 400, tares: 55, capacity: 123 },
] as const

/** Puts a fleet into the cache of a server that runs, each cylinder with a state that the fold has made of its life; answers the states. */
export async function fillKitFleet(databaseFile: string, count: number, setting: Omit<FleetSetting, 'ruledBy' | 'nowMs'>): Promise<CylinderState[]> {
  await fillFleet(databaseFile, count, setting)
  const db = await openDatabase(`file:${databaseFile}`)
  try {
    const { rows } = await db.readClient.execute('SELECT id FROM cylinders WHERE state = \'{}\' ORDER BY id')
    const states: CylinderState[] = []
    for (let from = 0; from < rows.length; from += ROWS_AT_ONCE) {
      // Connections that the server closes meanwhile are to be noticed.
      await nextTurn()
      const some = rows.slice(from, from + ROWS_AT_ONCE).map((row, index) => ({ before: row[0] as string, state: lifeOf(randomId(`${from + index} cylinder`), from + index, setting) }))
      await db.write(some.map(({ before, state }) => ({
        sql: 'UPDATE cylinders SET id = ?, state = ? WHERE id = ?', args: [state.id, JSON.stringify(state), before],
      })))
      states.push(...some.map(({ state }) => state))
    }
    return states
  }
  finally {
    db.close()
  }
}

/** One cylinder by its number; the same number gives the same one, and two have as little in common as in a real fleet. */
function lifeOf(id: string, index: number, { places, holders, owner }: Omit<FleetSetting, 'ruledBy' | 'nowMs'>): CylinderState {
  const bytes = createHash('sha256').update(`${index} life`).digest()
  const dice = (sides: number, salt: number) => bytes.readUInt32LE(salt % 29) % sides
  const steel = STEEL[dice(3, 0)]!
  const tare = lb(steel.tares + dice(20, 1) / 10)
  const refrigerant = REFRIGERANTS[dice(6, 2)]!
  const gross = (pounds: number) => lb(tare.value + pounds + dice(100, 3) / 20)
  const at = (day: number, salt: number) => ({ occurredAt: Date.UTC(2025, 5, 1) + day * 24 * 60 * MINUTE + dice(1_440, salt) * MINUTE })
  const story: Told[] = [
    registered({
      stamp: {
        serial: `${'ABCDEFGHKMT'[dice(11, 4)]}${10_000_000 + dice(89_999_999, 5)}`, maker: ['QZT', 'VHX', 'ORL'][dice(3, 6)]!, spec: steel.spec, servicePressurePsig: steel.psig,
        tareWeight: tare, waterCapacity: lb(steel.capacity), madeMonth: `${2014 + dice(11, 7)}-${String(1 + dice(12, 8)).padStart(2, '0')}`, flammableMarked: dice(5, 9) === 0,
      },
      marks: dice(3, 10) === 0 ? [{ month: `${2020 + dice(5, 11)}-0${1 + dice(9, 12)}`, rin: ['Z987', 'A123'][dice(2, 13)]! }] : [],
      contents: 'evacuated', gross: tare,
    }, { placeId: places[0]!, ...at(dice(200, 14), 15) }),
    did('labelled', { code: labelCode(index) }, at(201, 16)),
    did('moved', { toPlaceId: places[dice(places.length, 17)]!, ...dice(4, 18) === 0 ? { toHolderId: holders[dice(holders.length, 19)]! } : {} }, at(250 + dice(50, 20), 21)),
  ]
  if (dice(4, 22) > 0) story.push(filled(refrigerant, 0, { grossBefore: tare, grossAfter: gross(dice(12, 23)), ...dice(20, 24) === 0 ? { ownerOfRefrigerantId: owner } : {} }, at(320 + dice(60, 25), 26)))
  if (dice(2, 27) === 0) story.push(did('weighed', { gross: gross(dice(12, 23)) }, at(400 + dice(90, 28), 29)))
  const events = recorded(...story).map((event): AnyRecordedEvent => ({ ...event, cylinderId: id }))
  return fold(events, FOLD_CONTEXT).state
}

function lb(value: number): MassReading & { unit: 'lb' } {
  return { unit: 'lb', value: Math.round(value * 100) / 100 }
}

function randomId(seed: string): string {
  const hex = createHash('sha256').update(seed).digest('hex')
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-7${hex.slice(13, 16)}-8${hex.slice(17, 20)}-${hex.slice(20, 32)}`
}

function labelCode(index: number): string {
  let draws = 0
  return drawLabelCode((count) => {
    draws++
    return new Uint8Array(createHash('sha256').update(`${index} label ${draws}`).digest().subarray(0, count))
  })
}
