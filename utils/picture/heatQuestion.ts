import type { CapacityView, CylinderView } from '../custody/cylinderView'
import type { MassReading } from '../quantity/mass'

/** What the behaviour with heat depends on: how much of which refrigerant in which volume. Units: net grams. */
export type HeatQuestion = {
  refrigerant: string
  netGrams: number
  /** Nothing is in it yet: it is asked as filled to its limit. */
  ofLimit: boolean
  waterCapacity: MassReading
}

/** What to ask of a cylinder's behaviour with heat; null where its contents, its weight or its volume is not known. */
export function heatQuestion(
  { forRefrigerant: refrigerant, fillLimitGrams }: Pick<CapacityView, 'forRefrigerant' | 'fillLimitGrams'>,
  { nothingInIt, netGrams: presentGrams, condition }: Pick<CylinderView['contents'], 'nothingInIt' | 'netGrams' | 'condition'>,
  waterCapacity: MassReading | null,
): HeatQuestion | null {
  const netGrams = nothingInIt ? fillLimitGrams : presentGrams
  const isNameless = !nothingInIt && (condition === 'mixed' || condition === 'unknown')
  if (refrigerant === null || netGrams === null || isNameless || waterCapacity === null) return null
  return { refrigerant, netGrams, ofLimit: nothingInIt, waterCapacity }
}
