import type { CylinderRow } from '../custody/cylinderView'
import { cylinderPath } from './cylinderPath'
import { nextStep } from './nextStep'

/** What is done with several chosen cylinders at once; of two that as many ask for, the earlier one comes first. */
export const SELECTION_ACTS = ['test', 'ship', 'label', 'move', 'plan'] as const
export type SelectionAct = (typeof SELECTION_ACTS)[number]

/** What each is called on its button. */
export const SELECTION_WORDS: Record<SelectionAct, string> = {
  test: 'Prepare a test lot with these', ship: 'Prepare a shipment with these', label: 'Print labels', move: 'Move these', plan: 'Plan with these',
}

const ACT_OF_SCREEN = { 'test-lot': 'test', 'shipment': 'ship', 'label': 'label', 'cylinder': null } as const

/** What is offered for chosen cylinders: the others first, the one that most of them ask for last. */
export interface SelectionOffer { others: SelectionAct[], primary: SelectionAct | null }

/**
 * What to offer for chosen cylinders: what most of them need next, of what the person may do.
 *
 * One aboard a van is moved first, whatever it needs after that. Where none needs anything of these, they can be moved.
 */
export function selectionOffer(
  rows: readonly CylinderRow[], may: ReadonlySet<SelectionAct>, vanIds: ReadonlySet<string>,
): SelectionOffer {
  const asked = rows.map(row => row.place !== null && vanIds.has(row.place.id) ? 'move' : actOfStep(row))
  const votes = (act: SelectionAct) => asked.filter(each => each === act).length
  const offered = SELECTION_ACTS.filter(act => may.has(act))
  const best = offered.reduce<SelectionAct | null>((most, act) => votes(act) > (most === null ? 0 : votes(most)) ? act : most, null)
  const primary = best ?? (may.has('move') ? 'move' : offered[0] ?? null)
  return { primary, others: offered.filter(act => act !== primary).reverse() }
}

/** The screen that does it to the chosen cylinders. */
export function selectionPath(act: SelectionAct, ids: readonly string[]): string {
  const list = ids.join(',')
  switch (act) {
    case 'test': return `/retests?with=${list}`
    case 'ship': return `/shipments?with=${list}`
    case 'label': return `/labels?cylinders=${list}`
    case 'move': return `/batch?act=move&expect=${list}`
    case 'plan': return `/plans?with=${list}`
  }
}

/** The screen of one cylinder's next step: its page, where a list or a label is not what it needs or is not for this person. */
export function stepPath(row: CylinderRow, may: ReadonlySet<SelectionAct>): string {
  const act = actOfStep(row)
  return act !== null && may.has(act) ? selectionPath(act, [row.id]) : cylinderPath(row)
}

function actOfStep(row: CylinderRow): SelectionAct | null {
  return ACT_OF_SCREEN[nextStep(row)?.screen ?? 'cylinder']
}
