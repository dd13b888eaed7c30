import type { Named } from '~~/utils/custody/cylinderView'
import type { StockElsewhere, WorthAnswer } from '~~/utils/contract/reclaim'
import { dayOfInstant } from '~~/utils/quantity/day'
import { worthOffers, type Candidate, type Taker } from '~~/utils/reclaim/worth'
import type { Database } from '../database/database'
import { directory, namesOf, type Directory } from '../directory/directory'
import { stockLines, type StockLine } from './candidates'
import { contaminationOf } from './contamination'
import { pricesOf, termsOn } from './terms'

/** Another process on the same database server may have written: how long an answer may lag. */
const LONGEST_AGE_MS = 15_000
/** What took longer is not reckoned through after every write, for a line among others: it stands for so many times as long. */
const QUICK_MS = 250
const STANDS_FOR = 20

const kept = new WeakMap<Database, { writes: number, at: number, tookMs: number, answer: Promise<WorthAnswer> }>()

/** What each reclaimer would take today of the stock, with all that was written here. */
export function worthToday(db: Database, nowMs: number): Promise<WorthAnswer> {
  const known = kept.get(db)
  return known?.writes === db.writes() && isYounger(known, LONGEST_AGE_MS, nowMs) ? known.answer : madeAnew(db, nowMs)
}

/** The same as it was some seconds ago, where the fleet is so large that making it takes long. */
export function worthLately(db: Database, nowMs: number): Promise<WorthAnswer> {
  const known = kept.get(db)
  return known && known.tookMs > QUICK_MS && isYounger(known, known.tookMs * STANDS_FOR, nowMs) ? known.answer : worthToday(db, nowMs)
}

function isYounger({ at }: { at: number }, ageMs: number, nowMs: number): boolean {
  return nowMs >= at && nowMs - at < ageMs
}

function madeAnew(db: Database, nowMs: number): Promise<WorthAnswer> {
  const begun = performance.now()
  const made = { writes: db.writes(), at: nowMs, tookMs: 0, answer: worthAnswer(db, nowMs) }
  kept.set(db, made)
  made.answer.then(() => {
    made.tookMs = performance.now() - begun
  }, () => kept.delete(db))
  return made.answer
}

async function worthAnswer(db: Database, nowMs: number): Promise<WorthAnswer> {
  const from = await directory(db)
  const today = dayOfInstant(nowMs, from.timeZone)
  const { lines, isAll } = await stockLines(db, from, nowMs)
  const { firm: firmName, place: placeName } = namesOf(from)
  const reclaimers = await Promise.all([...from.firms.values()].filter(({ kind, active }) => kind === 'reclaimer' && active)
    .sort((a, b) => a.name.localeCompare(b.name, 'en'))
    .map(async ({ id, name }) => ({ id, name, terms: await termsOn(db, id, today) })))
  const takers = await Promise.all(reclaimers.flatMap(({ id, terms }) => terms ? [takerOf(db, id, terms)] : []))
  const candidates = await withContamination(db, inShops(lines, from), takers)
  return {
    today, stock: lines.length, isAll, reclaimers,
    places: named(candidates.map(({ placeId }) => placeId), placeName),
    owners: named(candidates.flatMap(({ ownerIds }) => ownerIds.filter(id => id !== null)), firmName),
    offers: worthOffers(candidates, takers, today),
    elsewhere: elsewhereOf(lines, from, placeName),
  }
}

async function takerOf(db: Database, id: string, terms: Taker['terms']): Promise<Taker> {
  return { id, terms, prices: await pricesOf(db, id) }
}

function inShops(lines: readonly StockLine[], from: Directory): Candidate[] {
  return lines.flatMap(({ candidate, placeId }) => placeId !== null && isShop(placeId, from) ? [{ ...candidate, placeId }] : [])
}

function isShop(placeId: string, from: Directory): boolean {
  const kind = from.places.get(placeId)?.kind
  // A rack within nothing is a shop of its own.
  return kind === 'shop' || kind === 'rack'
}

/** Looked up only where a limit asks for it. */
async function withContamination(db: Database, candidates: readonly Candidate[], takers: readonly Taker[]): Promise<Candidate[]> {
  if (takers.every(({ terms }) => terms.mostContaminationPercent === null)) return [...candidates]
  const shares = await contaminationOf(db, candidates.map(({ id }) => id))
  return candidates.map(candidate => ({ ...candidate, contaminationPercent: shares.get(candidate.id) }))
}

function elsewhereOf(lines: readonly StockLine[], from: Directory, placeName: (id: string) => Named): StockElsewhere[] {
  const sums = new Map<string | null, StockElsewhere>()
  for (const { placeId, candidate } of lines) {
    if (placeId !== null && isShop(placeId, from)) continue
    const sum = sums.get(placeId) ?? { place: placeId === null ? null : placeName(placeId), cylinders: 0, netGrams: 0 }
    sums.set(placeId, { ...sum, cylinders: sum.cylinders + 1, netGrams: sum.netGrams + (candidate.netGrams ?? 0) })
  }
  return [...sums.values()].sort((a, b) => b.netGrams - a.netGrams)
}

function named(ids: readonly string[], name: (id: string) => Named): Named[] {
  return [...new Set(ids)].map(name).sort((a, b) => a.name.localeCompare(b.name, 'en'))
}
