import { v7 } from 'uuid'

/** Chance that comes out the same at each run: the demo firm is always the same firm. */
export interface Random {
  /** 0 up to, but not, 1. */
  next: () => number
  between: (low: number, high: number) => number
  /** Both ends included. */
  whole: (low: number, high: number) => number
  pick: <T>(list: readonly T[]) => T
  chance: (probability: number) => boolean
  uuid: (ms: number) => string
  bytes: (count: number) => Uint8Array
}

/** A seeded source (mulberry32, public domain). */
export function seededRandom(seed: number): Random {
  let state = seed >>> 0
  const next = () => {
    state = (state + 0x6D2B79F5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), state | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296
  }
  const bytes = (count: number) => Uint8Array.from({ length: count }, () => Math.floor(next() * 256))
  return {
    next,
    between: (low, high) => low + next() * (high - low),
    whole: (low, high) => low + Math.floor(next() * (high - low + 1)),
    pick: list => list[Math.floor(next() * list.length)]!,
    chance: probability => next() < probability,
    uuid: ms => v7({ msecs: ms, random: bytes(16), seq: Math.floor(next() * 0x7FFFFFFF) }),
    bytes,
  }
}
