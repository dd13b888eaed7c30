import type { KitAnswer, KitFirm } from '~~/utils/contract/kit'
import { fold } from '~~/utils/custody/fold'
import type { CylinderState } from '~~/utils/custody/state'
import { KIT_FORM, packCylinder } from '~~/utils/kit/packCylinder'
import { FOLD_CONTEXT, recorded, SHOP, TECHNICIAN, VAN, type Told } from './custody'

/** A firm with a shop, a van and its technician, as phones keep it. */
export const KIT_FIRM: KitFirm = {
  policy: { timeZone: 'America/Chicago', fillPolicies: [], retests: [], rules: [], scales: [] },
  scales: [],
  places: [
    { id: SHOP, name: 'North shop', kind: 'shop', parentId: null, firmId: null, technicianId: null, technicianName: null, active: true },
    { id: VAN, name: 'Van 7', kind: 'van', parentId: null, firmId: null, technicianId: TECHNICIAN, technicianName: 'Tina', active: true },
  ],
  firms: [],
  people: [{
    id: TECHNICIAN, name: 'Tina', email: null, roles: ['technician'], trainee: false, certification: null, certificationType: 'universal', certificationNumber: null,
    supervisor: null, vans: [{ id: VAN, name: 'Van 7' }], active: true, invited: false,
  }],
  vans: [{ vanId: VAN, materials: null, checkIn: null }],
  jobs: [],
}

/** A cylinder after a story, under an id of its own. */
export function stateOf(id: string, ...story: Told[]): CylinderState {
  return { ...fold(recorded(...story), FOLD_CONTEXT).state, id }
}

/** What the server answers to a phone that has nothing, or that is to get these cylinders next. */
export function kitAnswerOf(states: readonly CylinderState[], more: Partial<KitAnswer> = {}): KitAnswer {
  return {
    form: KIT_FORM, anew: false, seq: 1, mark: '0123456789abcdef', cylinders: states.map(packCylinder), next: null, more: false,
    firm: { tag: 'fedcba9876543210', ...KIT_FIRM }, ...more,
  }
}
