import type { Access } from '../access/roles'
import type { CylinderView } from '../custody/cylinderView'
import type { EventKind } from '../custody/kinds'
import { mayPost } from '../custody/posting'
import type { StatusKind } from './status'

/** What a person may record of a cylinder. */
export interface PlannedActs {
  /** What is likeliest to be done now; null where nothing more is to be done, or nothing may be. */
  primary: { kind: EventKind, text: string } | null
  /** The others that may be recorded, what a hand does most often first. */
  others: EventKind[]
  /** Why a kind is no plan for this cylinder; what happened may still be recorded. */
  refusals: Partial<Record<EventKind, string>>
}

// What a hand does most often comes first; the primary one is apart.
const ACTS: readonly EventKind[] = ['weighed', 'drawn', 'moved', 'handed-over', 'filled', 'transferred', 'checked', 'emptied', 'lost', 'labelled', 'received', 'returned', 'exchanged', 'inspected', 'quarantined', 'released', 'missing', 'found', 'retired', 'countersigned']

// Where there is nothing to lift, to find or to sign, these are not so much refused as without a meaning.
const ONLY_WHERE_PLANNED: readonly EventKind[] = ['released', 'missing', 'found', 'countersigned']

/** What may be recorded of a cylinder by this person, the likeliest apart, where `verdict` is the kind of its first line. */
export function plannedActs(view: CylinderView, verdict: StatusKind, access: Access | null): PlannedActs {
  const { nothingInIt } = view.contents
  const refusals = Object.fromEntries(view.mayNot.map(each => [each.kind, each.because])) as Partial<Record<EventKind, string>>
  const planned: { kind: EventKind, text: string }[] = [
    ...(view.lifecycle === 'missing' ? [{ kind: 'found' as const, text: 'It was found' }] : []),
    // Which refrigerant goes into an empty one is asked by the form as well.
    ...(verdict !== 'stop' && (!refusals.filled || (nothingInIt && !view.capacity.forRefrigerant)) ? [{ kind: 'filled' as const, text: 'Record a recovery' }] : []),
    ...(refusals.moved ? [] : [{ kind: 'moved' as const, text: 'Move it' }]),
    ...(refusals.drawn || nothingInIt ? [] : [{ kind: 'drawn' as const, text: 'Draw it down' }]),
    { kind: 'weighed', text: 'Weigh it' },
  ]
  // Nothing more is to be done with what ended its life and has nothing in it.
  const isDone = nothingInIt && ['condemned', 'retired'].includes(view.lifecycle)
  const primary = isDone ? null : planned.find(plan => mayPost(access, plan.kind)) ?? null
  // No role signs: the entry names who does.
  const mayRecord = (kind: EventKind) => kind === 'countersigned' ? view.may.includes(kind) : mayPost(access, kind)
  const isMeant = (kind: EventKind) => refusals[kind] === undefined || !ONLY_WHERE_PLANNED.includes(kind)
  return { primary, others: ACTS.filter(kind => mayRecord(kind) && kind !== primary?.kind && isMeant(kind)), refusals }
}
