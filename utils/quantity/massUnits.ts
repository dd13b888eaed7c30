import type { MassUnit } from './mass'

/** The units of weight as they are chosen, in their usual order. */
export const MASS_UNITS: { value: MassUnit, label: string }[] = [
  { value: 'lb', label: 'lb' }, { value: 'lb-oz', label: 'lb oz' }, { value: 'kg', label: 'kg' },
]
