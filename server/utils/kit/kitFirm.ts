import type { KitFirm, KitVan } from '../../../utils/contract/kit'
import { sha256 } from '../custody/sha256'
import type { Database } from '../database/database'
import { directory, type Directory } from '../directory/directory'
import { policyAnswer } from '../directory/policyAnswer'
import { listFirms } from '../firms/firms'
import { jobRows } from '../jobs/jobRows'
import { personLine } from '../people/personLine'
import { listPlaces } from '../places/places'
import { listScales } from '../scales/scales'
import { lastCheckIn } from '../vans/checkIns'
import { materialsByVan } from '../vans/materials'

/** The firm as phones keep it, and the tag by which they know it again. */
export type TaggedFirm = KitFirm & { tag: string }

/** A fill that happens without the server is of one of these, or tied to its job later. */
const JOBS_KEPT = 30

const made = new WeakMap<Directory, Promise<TaggedFirm>>()

/** The firm as phones keep it: made once for each reading of the directory, however many phones ask. */
export async function kitFirm(db: Database): Promise<TaggedFirm> {
  const from = await directory(db)
  const before = made.get(from)
  if (before) return before
  const making = makeFirm(db, from)
  made.set(from, making)
  making.catch(() => made.delete(from))
  return making
}

async function makeFirm(db: Database, from: Directory): Promise<TaggedFirm> {
  const [places, firms, scales, materials, jobs] = await Promise.all([listPlaces(db), listFirms(db), listScales(db), materialsByVan(db, from), jobRows(db, undefined, JOBS_KEPT)])
  const { timeZone, fillPolicies, retests, rules, scales: ruleScales } = policyAnswer(from, 0, 0)
  const vans = await Promise.all(places.filter(({ kind, active }) => kind === 'van' && active).map(async ({ id: vanId }): Promise<KitVan> => {
    const checkIn = await lastCheckIn(db, vanId)
    return {
      vanId,
      materials: materials.get(vanId) ?? null,
      checkIn: checkIn && { missing: checkIn.missing, checkedBy: checkIn.checkedBy, checkedAt: new Date(checkIn.checkedAt).toISOString() },
    }
  }))
  const firm: KitFirm = {
    policy: { timeZone, fillPolicies, retests, rules, scales: ruleScales },
    scales,
    // How many stand there changes with every move: a phone counts for itself.
    places: places.map(({ cylinders: _, ...place }) => place),
    firms: firms.map(({ cylinders: _, ...other }) => other),
    people: [...from.people.values()].sort(byName).map(row => personLine(row, from, false)),
    vans,
    jobs: jobs.map(({ changes: _, ...job }) => job),
  }
  return { tag: sha256(JSON.stringify(firm)).slice(0, 16), ...firm }
}

/** As the database puts them. */
function byName(a: { name: string, id: string }, b: { name: string, id: string }): number {
  return a.name < b.name ? -1 : a.name > b.name ? 1 : a.id < b.id ? -1 : 1
}
