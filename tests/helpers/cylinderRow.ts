import type { CylinderRow } from '../../utils/custody/cylinderView'

/** A cylinder as the fleet lists it: 22.6 lb of R-410A in one that may hold 38.0 lb, in date, on a van. */
export function cylinderRow(change: Partial<CylinderRow> = {}): CylinderRow {
  return {
    id: '01900000-0000-7000-8000-000000000001',
    labelCode: '7K3M9Q2TX',
    serial: 'K48213',
    spec: 'DOT-4BA',
    place: { id: '01900000-0000-7000-8000-0000000000a1', name: 'Van 12' },
    holder: null,
    owner: null,
    refrigerant: 'R-410A',
    condition: 'clean',
    lifecycle: 'in-service',
    nothingInIt: false,
    netGrams: 10_251,
    fillLimitGrams: 17_272,
    governingRule: 'water-weight',
    roomGrams: 7_021,
    stopWeightGrams: 29_746,
    exactStopWeightGrams: 29_746.6,
    tareWeightGrams: 12_474,
    waterCapacityGrams: 21_591,
    dueMonth: '2029-03',
    lastEventAt: '2026-11-30T16:00:00Z',
    lastEventKind: 'filled',
    unseen: null,
    worstFinding: null,
    findingCodes: [],
    ...change,
  }
}
