import type { Standing } from '../../../utils/contract/places'
import type { Database } from '../database/database'

/** What stands in each place: how many cylinders, what is in them and what they weigh as far as that is known. */
export async function standingByPlace(db: Database): Promise<Standing[]> {
  const result = await db.readClient.execute(`
    SELECT place_id, CASE WHEN nothing_in_it = 1 THEN 'none' ELSE refrigerant END AS holds, count(*) AS cylinders,
      coalesce(sum(tare_weight_grams + net_grams), 0) AS gross_grams,
      sum(tare_weight_grams IS NULL OR net_grams IS NULL) AS without_weight
    FROM cylinders WHERE place_id IS NOT NULL GROUP BY place_id, holds ORDER BY place_id, cylinders DESC, holds`)
  const byPlace = new Map<string, Standing>()
  for (const row of result.rows) {
    const placeId = row['place_id'] as string
    const cylinders = row['cylinders'] as number
    const standing = byPlace.get(placeId) ?? { placeId, cylinders: 0, grossGrams: 0, withoutWeight: 0, refrigerants: [] }
    standing.cylinders += cylinders
    standing.grossGrams += row['gross_grams'] as number
    standing.withoutWeight += row['without_weight'] as number
    standing.refrigerants.push({ refrigerant: row['holds'] as string | null, cylinders })
    byPlace.set(placeId, standing)
  }
  return [...byPlace.values()]
}
