import { LOT, RECLAIMER_PLACE, SHIPMENT, SHOP, TEST_PLACE } from './custody'

/*
 * A custody log read by hand, one event after another, without any of the code under test. Tares are 12.00 kg, gross
 * weights either that or at least 13 kg, so that no reading lies near the accuracy of a scale.
 */

/** What may happen in these tests, with its true time in minutes; masses in whole grams. */
export type Happening = { id: string, cylinder: string, minute: number } & (
  | { kind: 'registered' } | { kind: 'moved', placeId: string, holderId: string | undefined } | { kind: 'handed-over', holderId: string }
  | { kind: 'weighed' | 'drawn', gross: number } | { kind: 'filled', name: string, condition: 'clean' | 'suspect' | undefined, gross: number }
  | { kind: 'emptied', deep: boolean } | { kind: 'lost' } | { kind: 'quarantined' } | { kind: 'released' } | { kind: 'missing' } | { kind: 'found', placeId: string | undefined }
  | { kind: 'received', gross: number | undefined } | { kind: 'sent-for-reclaim', gross: number } | { kind: 'reclaimed' } | { kind: 'sent-for-test' }
  | { kind: 'retested', result: 'passed' | 'rejected' | 'condemned', wet: boolean } | { kind: 'retired' }
  | { kind: 'corrected', eventId: string, gross: number | undefined })

/** What is compared with the fold. */
export interface Plain {
  netGrams: number | null
  refrigerant: string | null
  condition: string
  placeId: string | null
  holderId: string | null
  lifecycle: string
}

const TARE = 12_000
const BAD_TO_GOOD = ['mixed', 'burnt', 'unknown', 'suspect', 'clean']
const LEAVES_MISSING = ['missing', 'corrected', 'retired']

/** One cylinder by its happenings, in whatever order they are given. */
export function readPlainly(all: readonly Happening[]): Plain {
  const inTime = [...all].sort((a, b) => a.minute - b.minute)
  const standing = inTime.flatMap(one => withCorrections(one, inTime))
  const first = standing.find(({ kind }) => kind === 'registered')
  const s = { net: null as number | null, name: null as string | null, condition: 'unknown', nothing: false, place: null as string | null, holder: null as string | null,
    away: null as string | null, missing: false, quarantined: false, rejected: false, condemned: false, retired: false, back: false, known: [] as string[] }
  const worse = (a: string, b: string) => BAD_TO_GOOD[Math.min(BAD_TO_GOOD.indexOf(a), BAD_TO_GOOD.indexOf(b))]!
  const empty = () => Object.assign(s, { net: 0, name: null, condition: 'clean', nothing: true, back: false })
  const unknown = () => Object.assign(s, { name: null, condition: 'unknown', nothing: false })
  const weigh = (gross: number) => {
    // Without a stamp there is no tare, and a weight tells nothing.
    if (!first) return void (s.net = null)
    if (gross === TARE && s.back) return void empty()
    if (s.nothing && gross > TARE) unknown()
    s.net = gross - TARE
  }
  for (const one of [...first ? [first] : [], ...standing.filter(each => each !== first)]) {
    if (!LEAVES_MISSING.includes(one.kind)) s.missing = false
    switch (one.kind) {
      case 'registered':
        if (one !== first) break
        empty()
        s.place = SHOP
        break
      case 'moved':
        Object.assign(s, { away: null, place: one.placeId, holder: one.holderId ?? null })
        break
      case 'handed-over':
        Object.assign(s, { away: null, holder: one.holderId })
        break
      case 'weighed': case 'drawn':
        s.away = null
        weigh(one.gross)
        break
      case 'filled': {
        s.away = null
        const other = s.known.some(name => name !== one.name)
        if (s.nothing) Object.assign(s, { name: one.name, condition: other ? worse(one.condition ?? 'clean', 'suspect') : one.condition ?? 'clean' })
        else if (s.name === null) s.condition = worse(s.condition, 'unknown')
        else if (s.name === one.name) s.condition = worse(s.condition, one.condition ?? s.condition)
        else Object.assign(s, { name: null, condition: 'mixed' })
        Object.assign(s, { nothing: false, back: false, net: first ? one.gross - TARE : null, known: [...s.known, one.name] })
        break
      }
      case 'emptied':
        if (one.deep) {
          empty()
          s.known = []
          if (!first) s.net = null
        }
        else if (!s.nothing) s.net = null
        break
      case 'lost':
        if (!s.nothing) s.net = null
        break
      case 'quarantined': case 'released':
        s.quarantined = one.kind === 'quarantined'
        break
      case 'missing':
        s.missing = true
        break
      case 'found':
        if (one.placeId !== undefined && one.placeId !== s.place) Object.assign(s, { away: null, place: one.placeId, holder: null })
        break
      case 'received':
        if (s.away === 'at-reclaim') {
          unknown()
          Object.assign(s, { back: true, net: null })
        }
        Object.assign(s, { away: null, place: SHOP, holder: null })
        if (one.gross !== undefined) weigh(one.gross)
        break
      case 'sent-for-reclaim':
        weigh(one.gross)
        Object.assign(s, { away: 'at-reclaim', place: RECLAIMER_PLACE, holder: null })
        break
      case 'reclaimed':
        if (s.away === 'at-reclaim') empty()
        break
      case 'sent-for-test':
        Object.assign(s, { away: 'at-test', place: TEST_PLACE, holder: null })
        break
      case 'retested':
        if (one.wet) empty()
        if (one.result === 'passed' && one.wet) s.rejected = false
        if (one.result === 'rejected') s.rejected = true
        if (one.result === 'condemned') s.condemned = true
        if (s.away === 'at-test') s.away = null
        break
      case 'retired':
        s.retired = true
        break
      case 'corrected':
    }
  }
  const lifecycle = s.retired ? 'retired' : s.condemned ? 'condemned' : s.missing ? 'missing' : s.away ?? (s.rejected ? 'rejected' : s.quarantined ? 'quarantined' : 'in-service')
  return { netGrams: s.net, refrigerant: s.name, condition: s.condition, placeId: s.place, holderId: s.holder, lifecycle }
}

/** A happening as the latest of its corrections left it; nothing where that took it out. */
function withCorrections(one: Happening, all: readonly Happening[]): Happening[] {
  const mends = all.filter(other => other.kind === 'corrected' && other.eventId === one.id && withCorrections(other, all).length > 0)
    .filter(other => other.kind === 'corrected' && (other.gross === undefined ? one.kind !== 'registered' : one.kind === 'weighed' || one.kind === 'received'))
  const latest = mends.at(-1)
  if (latest?.kind !== 'corrected') return [one]
  if (latest.gross === undefined) return []
  return [{ ...one, gross: latest.gross } as Happening]
}

/** The details of a happening as an event has them. */
export function detailsOf(one: Happening): object {
  const kg = (grams: number) => ({ unit: 'kg', value: grams / 1000 })
  switch (one.kind) {
    case 'registered': return { stamp: { serial: 'A1001', spec: 'DOT-4BA', servicePressurePsig: 400, tareWeight: kg(TARE), waterCapacity: kg(20_000), madeMonth: '2024-03', flammableMarked: true }, ownership: 'own', contents: 'evacuated' }
    case 'moved': return { toPlaceId: one.placeId, ...one.holderId && { toHolderId: one.holderId } }
    case 'handed-over': return { toHolderId: one.holderId }
    case 'weighed': return { gross: kg(one.gross) }
    case 'drawn': return { grossAfter: kg(one.gross), purpose: 'same-system' }
    case 'filled': return { refrigerant: one.name, grossAfter: kg(one.gross), looked: true, ...one.condition && { condition: one.condition } }
    case 'emptied': return one.deep ? { vacuum: { microns: 500 } } : {}
    case 'lost': return { cause: 'hose' }
    case 'quarantined': case 'released': return { reason: 'a look' }
    case 'missing': return {}
    case 'found': return one.placeId ? { placeId: one.placeId } : {}
    case 'received': return one.gross === undefined ? {} : { gross: kg(one.gross) }
    case 'sent-for-reclaim': return { shipmentId: SHIPMENT, gross: kg(one.gross) }
    case 'reclaimed': return { shipmentId: SHIPMENT }
    case 'sent-for-test': return { lotId: LOT }
    case 'retested': return { month: '2026-07', method: one.wet ? 'volumetric' : 'visual', result: one.result, requalifierId: '0198f000-0000-7000-8000-0000000000f3' }
    case 'retired': return { reason: 'scrapped' }
    case 'corrected': return { eventId: one.eventId, reason: 'a slip', ...one.gross !== undefined && { instead: { gross: kg(one.gross) } } }
  }
}

/** Where a happening says that the cylinder stands. */
export function placeOf({ kind }: Happening): string | null {
  return kind === 'registered' || kind === 'received' ? SHOP : kind === 'sent-for-reclaim' ? RECLAIMER_PLACE : kind === 'sent-for-test' ? TEST_PLACE : null
}
