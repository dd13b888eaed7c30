import { z } from 'zod'
import type { Database } from '../database/database'
import { problem } from '../http/problem'
import { findCylinder } from './findCylinder'

/** {ref}: an id, a label code or a stamped serial. */
export const cylinderParams = z.strictObject({ ref: z.string().min(1).max(80) })

/** The id of the cylinder that a reference names. Errors: problem 404. */
export async function theCylinder(db: Database, ref: string): Promise<string> {
  const id = await findCylinder(db, ref)
  if (!id) throw problem(404, 'No such cylinder', 'No cylinder has this code, serial or id.')
  return id
}
