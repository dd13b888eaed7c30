import { PAIRED_KINDS } from './kinds'

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/

/** What can be read of one half of a pair, however malformed; ids in lower case, null where there is none. */
interface ReadableHalf { pairId: string | null, cylinderId: string | null, otherId: string | null }

/**
 * The events of one request as they are stored or refused: each alone, but the halves of a pair together.
 *
 * A half whose pair cannot be read still belongs to the one that names its cylinder, or whose cylinder it names.
 *
 * Shape: positions in the request, each in one unit.
 */
export function requestUnits(raws: readonly unknown[]): number[][] {
  const units: { halves: ReadableHalf[], positions: number[] }[] = []
  raws.forEach((raw, position) => {
    const half = readableHalf(raw)
    const unit = half && units.find(({ halves }) => halves.some(other => areOfOnePair(half, other)))
    if (unit) {
      unit.halves.push(half)
      unit.positions.push(position)
    }
    else units.push({ halves: half ? [half] : [], positions: [position] })
  })
  return units.map(({ positions }) => positions)
}

function areOfOnePair(a: ReadableHalf, b: ReadableHalf): boolean {
  if (a.pairId !== null && b.pairId !== null) return a.pairId === b.pairId
  return (a.otherId !== null && a.otherId === b.cylinderId) || (b.otherId !== null && b.otherId === a.cylinderId)
}

function readableHalf(raw: unknown): ReadableHalf | null {
  const { kind, cylinderId, details } = Object(raw) as Record<string, unknown>
  const { transferId, exchangeId, counterpartId, otherCylinderId } = Object(details) as Record<string, unknown>
  const isPaired = (PAIRED_KINDS as readonly unknown[]).includes(kind) || transferId !== undefined || exchangeId !== undefined
  return isPaired ? { pairId: id(transferId ?? exchangeId), cylinderId: id(cylinderId), otherId: id(counterpartId ?? otherCylinderId) } : null
}

function id(value: unknown): string | null {
  const text = typeof value === 'string' ? value.toLowerCase() : ''
  return UUID.test(text) ? text : null
}
