import type { KitBox } from '~~/composables/kitBox'
import type { KitFirm } from '~~/utils/contract/kit'
import type { continueFold } from '~~/utils/custody/continueFold'
import type { CylinderRow, CylinderView } from '~~/utils/custody/cylinderView'
import type { AnyCustodyEvent, CustodyEvent } from '~~/utils/custody/event'
import { isGivenAway } from '~~/utils/custody/lifecycle'
import { recordedNow } from '~~/utils/custody/recordedNow'
import { cacheRow, rowToday } from '~~/utils/custody/row'
import { NOTHING_SAID, type SaidByOthers } from '~~/utils/custody/saidByOthers'
import { initialState, type CylinderState } from '~~/utils/custody/state'
import { view, type Names } from '~~/utils/custody/view'
import { endsStamp, squeezed } from '~~/utils/fleet/stampHits'
import { kitContext, type KitAsking } from '~~/utils/kit/kitContext'
import { codesOnTwo, ownerOfCode, tailOf, type KitEntry } from '~~/utils/kit/kitEntry'
import { unpackCylinder } from '~~/utils/kit/packCylinder'
import { normaliseLabelCode } from '~~/utils/label/code'
import type { RecordedEntry } from '~~/utils/outbox/entry'
import type { Catalogue } from '~~/utils/refrigerant/types'

/** A cylinder as this device has it, and how many of its waiting events it could not be gone on with. */
export interface OnDevice { state: CylinderState, waitingNotIn: number }

/** What a reader of the copy goes by. */
export interface KitSources {
  box: KitBox
  firm: KitFirm
  names: Names
  catalogue: Catalogue
  /** Events of this person that wait on the device, in their order. */
  waiting: readonly CustodyEvent[]
  /** Events of this person that were recorded from the device, and that the copy need not have yet. */
  recorded: readonly RecordedEntry[]
  asking: KitAsking
}

const UUID = /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/
/** More than ever end alike. */
const MOST_ALIKE = 200

/** Reads cylinders out of this device's copy, each with what waits on the device on top of it. */
export async function kitReader({ box, firm, names, catalogue, waiting, recorded, asking }: KitSources) {
  const context = (said: SaidByOthers, more: Partial<KitAsking> = {}) => kitContext(firm, names, catalogue, said, { ...asking, ...more })
  const touched = await withWaiting()

  async function withWaiting(): Promise<Map<string, OnDevice>> {
    const ids = [...new Set([...recorded.map(({ event }) => event), ...waiting].map(({ cylinderId }) => cylinderId))]
    if (ids.length === 0) return new Map()
    // The fold brings the schemas of the events with it: only who has something waiting fetches it.
    const { continueFold } = await import('~~/utils/custody/continueFold')
    const kept = new Map((await box.byIds(ids)).map(({ id, packed }) => [id, unpackCylinder(packed)]))
    return new Map(ids.flatMap((id): [string, OnDevice][] => {
      const before = kept.get(id) ?? initialState(id)
      const events = [...recordedAfter(before), ...waiting.filter(({ cylinderId }) => cylinderId === id)]
      return events.length === 0 ? [] : [[id, goneOn(before, events, continueFold)]]
    }))
  }

  function goneOn(before: CylinderState, events: readonly CustodyEvent[], goOn: typeof continueFold): OnDevice {
    const asRecorded = events.map((event, index) => recordedNow(event as AnyCustodyEvent, { seq: index, version: before.version + index }, asking))
    const folded = goOn(before, asRecorded, context(NOTHING_SAID))
    return folded ? { state: folded.state, waitingNotIn: 0 } : { state: before, waitingNotIn: events.length }
  }

  /** What was recorded from here straight after the copy's last event of a cylinder. */
  function recordedAfter({ id, version }: CylinderState): CustodyEvent[] {
    const later = recorded.filter(entry => entry.event.cylinderId === id && entry.version > version).sort((a, b) => a.version - b.version)
    // Where another's came between them, it takes that one to know what then holds.
    return later.filter((entry, index) => entry.version === version + 1 + index).map(({ event }) => event)
  }

  const stateOf = ({ id, packed }: KitEntry) => touched.get(id)?.state ?? unpackCylinder(packed)

  /** Entries as states, and with them every cylinder that something waits for: it may have come to be among them. */
  function statesOf(entries: readonly KitEntry[]): CylinderState[] {
    const states = new Map(entries.map(entry => [entry.id, stateOf(entry)]))
    for (const [id, { state }] of touched) states.set(id, state)
    return [...states.values()].sort((a, b) => a.id < b.id ? -1 : 1)
  }

  async function having(index: Parameters<KitBox['having']>[0], value: string): Promise<CylinderState[]> {
    return statesOf(await box.having(index, value))
  }

  async function saidOf(state: CylinderState): Promise<SaidByOthers> {
    const [naming, ...claiming] = await Promise.all([having('names', state.id), ...state.labels.map(({ code }) => having('codes', code))])
    return {
      codesOnTwo: codesOnTwo(state, statesById(claiming.flat())),
      otherHalves: naming.filter(({ id }) => id !== state.id).flatMap(({ halves }) => halves.filter(({ otherId }) => otherId === state.id)),
    }
  }

  /** The cylinder that a reference names: its id, a label code, or its stamped serial where only one has it. */
  async function find(ref: string): Promise<OnDevice | null> {
    const id = ref.toLowerCase()
    if (UUID.test(id)) {
      const known = touched.get(id)
      if (known) return known
      const [entry] = await box.byIds([id])
      return entry ? { state: stateOf(entry), waitingNotIn: 0 } : null
    }
    const code = normaliseLabelCode(ref)
    const owner = code && ownerOfCode(code, await having('codes', code))
    if (owner) return onDevice(owner)
    const alike = (await endingWith(ref)).filter(({ stamp }) => stamp?.serial === ref)
    return alike.length === 1 ? onDevice(alike[0]!) : null
  }

  const onDevice = (state: CylinderState): OnDevice => touched.get(state.id) ?? { state, waitingNotIn: 0 }

  async function endingWith(typed: string): Promise<CylinderState[]> {
    const found = squeezed(typed) === '' ? [] : await box.endingWith(tailOf(typed), MOST_ALIKE)
    return statesOf(found).filter(({ stamp }) => endsStamp(stamp?.serial ?? null, typed))
  }

  async function viewOf({ state, waitingNotIn }: OnDevice, askedRefrigerant: string | null): Promise<CylinderView> {
    const shown = view(state, context(await saidOf(state), { askedRefrigerant }))
    return waitingNotIn === 0 ? shown : { ...shown, waitingNotIn }
  }

  async function rowOf(state: CylinderState): Promise<CylinderRow> {
    const today = context(await saidOf(state))
    return rowToday({ id: state.id, ...cacheRow(state, today) }, today)
  }

  return {
    find,
    saidOf,
    viewOf,
    rowsOf: (states: readonly CylinderState[]) => Promise.all(states.map(rowOf)),
    at: async (placeId: string) => (await having('placeId', placeId)).filter(state => state.placeId === placeId),
    heldBy: async (personId: string) => (await having('holderId', personId)).filter(state => state.holderId === personId && !isGivenAway(state)),
    withCode: async (code: string) => (await having('codes', code)).filter(state => state.labelCode === code),
    endingWith,
    byIds: async (ids: readonly string[]) => statesOf(await box.byIds(ids)).filter(({ id }) => ids.includes(id)),
    onTwo: async () => {
      const states = await Promise.all((await box.codesHadByTwo()).map(code => having('codes', code)))
      const all = statesById(states.flat())
      return all.filter(state => codesOnTwo(state, all).size > 0)
    },
  }
}

export type KitReader = Awaited<ReturnType<typeof kitReader>>

function statesById(states: readonly CylinderState[]): CylinderState[] {
  return [...new Map(states.map(state => [state.id, state])).values()]
}
