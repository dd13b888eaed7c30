import type { MassReading } from '../../../utils/quantity/mass'
import { HOUR, MINUTE } from './calendar'
import { daysAgo, fill, made } from './incidents'
import type { Stage } from './lives'
import { newSteel, pounds, weigh, type Steel } from './steel'

/** What happens between two cylinders: a transfer that balances, one that does not, one of which half is missing, and an exchange. */
export function playPairs(stage: Stage): void {
  transfer(stage, { days: 11, outPounds: 12, inPounds: 12 })
  transfer(stage, { days: 6, outPounds: 10, inPounds: 7.5 })
  transfer(stage, { days: 3, outPounds: 6, inPounds: null })
  exchange(stage)
}

function transfer(stage: Stage, { days, outPounds, inPounds }: { days: number, outPounds: number, inPounds: number | null }): void {
  const { cast, script, random } = stage
  const { second } = cast.people
  const from = made(stage, 5).steel
  const into = made(stage, 5).steel
  fill(stage, from, { refrigerant: 'R-410A', pounds: 19, days: days + 9 })
  const at = daysAgo(stage, days)
  const transferId = random.uuid(at)
  const half = (steel: Steel, counterpart: Steel, direction: 'out' | 'in', changePounds: number) => {
    const grossBefore: MassReading = weigh(steel, second.reads)
    steel.netGrams += pounds(changePounds)
    steel.refrigerant = 'R-410A'
    script.add(second, at, steel.id, 'transferred', {
      direction, counterpartId: counterpart.id, transferId, refrigerant: 'R-410A', condition: 'clean', grossBefore, grossAfter: weigh(steel, second.reads),
    }, { lateMs: 5 * MINUTE })
  }
  half(from, into, 'out', -outPounds)
  if (inPounds !== null) half(into, from, 'in', inPounds)
}

/** An empty cylinder goes to the supplier, a full one of the supplier's comes for it. */
function exchange(stage: Stage): void {
  const { cast, script, random } = stage
  const { warehouse } = cast.people
  const out = made(stage, 6).steel
  const at = daysAgo(stage, 15)
  const full = newSteel(random, at, 'middle', { testedMonthsAgo: 8 })
  full.netGrams = pounds(25)
  full.refrigerant = 'R-134a'
  script.add(warehouse, at - HOUR, full.id, 'registered', {
    stamp: full.stamp, marks: [{ month: full.testedMonth }], ownership: 'deposit', ownerId: cast.firms.supplier.id,
    contents: { refrigerant: 'R-134a', condition: 'clean' }, gross: weigh(full, 'lb'),
  }, { placeId: cast.racks[0]!.id, lateMs: 2 * MINUTE })
  script.add(warehouse, at - 50 * MINUTE, full.id, 'labelled', { code: full.code }, { lateMs: 2 * MINUTE })
  const exchangeId = random.uuid(at)
  const firmId = cast.firms.supplier.id
  script.add(warehouse, at, out.id, 'exchanged', { direction: 'out', otherCylinderId: full.id, exchangeId, firmId }, { lateMs: MINUTE })
  script.add(warehouse, at, full.id, 'exchanged', { direction: 'in', otherCylinderId: out.id, exchangeId, firmId }, { lateMs: MINUTE, placeId: cast.racks[0]!.id })
}
