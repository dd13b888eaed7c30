import type { MassReading } from '~~/utils/quantity/mass'
import type { Stamp } from '~~/utils/capacity/types'

/** A reading in pounds. */
export function lb(value: number): MassReading {
  return { unit: 'lb', value }
}

/** The stamp of a 50 lb recovery cylinder marked for flammables, changed where a test needs it. */
export function stampOf(changes: Partial<Stamp> = {}): Stamp {
  return {
    serial: 'A1001',
    spec: 'DOT-4BA',
    servicePressurePsig: 400,
    tareWeight: lb(27.5),
    waterCapacity: lb(47.6),
    madeMonth: '2022-03',
    flammableMarked: true,
    ...changes,
  }
}
