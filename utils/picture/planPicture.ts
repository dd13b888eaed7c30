import { layOutFillBar } from './fillBar'

/** A cylinder drawn upright: how high its contents stand and where its limit lies, in percent of its height. */
export interface UprightFill { level: number, limit: number }

/** A cylinder before and after a plan; null where its figures are not known. */
export function planPicture(cylinder: { beforeGrams: number | null, afterGrams: number | null, limitGrams: number | null, waterCapacityGrams: number | null }): { before: UprightFill, after: UprightFill } | null {
  const { beforeGrams, afterGrams, limitGrams, waterCapacityGrams } = cylinder
  const [before, after] = [beforeGrams, afterGrams].map(grams => layOutFillBar(grams, limitGrams, waterCapacityGrams))
  if (!before || !after) return null
  return { before: { level: before.filled + before.over, limit: before.limit }, after: { level: after.filled + after.over, limit: after.limit } }
}
