import { describe, expect, it } from 'vitest'
import { plannedActs } from '../../../../utils/picture/plannedActs'
import { did, filled, registered, REQUALIFIER, TECHNICIAN, VIEW_CONTEXT, viewAfter, weighed } from '../../../helpers/custody'

const { access } = VIEW_CONTEXT

// Tare 12 kg, room for 16 kg of R-22: a gross of 28 kg is the limit.
describe('the likeliest act with a cylinder', () => {
  it('is a recovery while there is room, and while nothing is in it whatever is to go in', () => {
    expect(plannedActs(viewAfter([registered(), filled('R-22', 20)]), 'ok', access).primary).toEqual({ kind: 'filled', text: 'Record a recovery' })
    const empty = plannedActs(viewAfter([registered()]), 'ok', access)
    expect(empty.refusals.filled).toBeDefined()
    expect(empty.primary).toEqual({ kind: 'filled', text: 'Record a recovery' })
  })

  it('is moving it where nothing may go in, and drawing it down where it may not be taken along either', () => {
    const overdue = viewAfter([registered(), filled('R-22', 20)], { nowMs: Date.UTC(2040, 0, 1) })
    expect(plannedActs(overdue, 'stop', access).primary).toEqual({ kind: 'moved', text: 'Move it' })
    const overfilled = viewAfter([registered(), filled('R-22', 28.5)])
    expect(plannedActs(overfilled, 'stop', access).primary).toEqual({ kind: 'drawn', text: 'Draw it down' })
  })

  it('is that it was found where it is missing; a release and a find are only offered where there is something to release or to find', () => {
    const missing = viewAfter([registered(), did('missing', {})])
    expect(plannedActs(missing, 'stop', access)).toMatchObject({ primary: { kind: 'found', text: 'It was found' } })
    expect(plannedActs(missing, 'stop', access).others).not.toContain('missing')
    const manager = { personId: TECHNICIAN, roles: ['manager' as const], trainee: false }
    const apart = viewAfter([registered(), did('quarantined', { reason: 'no label' })], { access: manager })
    expect(plannedActs(apart, 'stop', manager).others).toContain('released')
    expect(plannedActs(apart, 'stop', access).others).not.toContain('released')
    expect(plannedActs(viewAfter([registered()], { access: manager }), 'ok', manager).others).not.toContain('released')
    expect(plannedActs(apart, 'stop', manager).others).not.toContain('found')
  })

  it('is a signature only for the supervisor it waits for', () => {
    const entry = { ...weighed(12), more: { trainee: true, supervisorId: TECHNICIAN, actorId: 'trainee' } }
    expect(plannedActs(viewAfter([registered(), entry]), 'ok', access).others).toContain('countersigned')
    expect(plannedActs(viewAfter([registered()]), 'ok', access).others).not.toContain('countersigned')
    const manager = { personId: 'm', roles: ['manager' as const], trainee: false }
    expect(plannedActs(viewAfter([registered(), entry], { access: manager }), 'ok', manager).others).not.toContain('countersigned')
  })

  it('is none once it is condemned and empty, though what happened may still be recorded', () => {
    const condemned = did('retested', { month: '2026-07', method: 'visual', result: 'condemned', requalifierId: REQUALIFIER })
    const { primary, others } = plannedActs(viewAfter([registered(), condemned]), 'stop', access)
    expect(primary).toBeNull()
    expect(others).toContain('filled')
  })

  it('is never offered twice, nor to somebody who records nothing', () => {
    const view = viewAfter([registered(), filled('R-22', 20), weighed(20)])
    expect(plannedActs(view, 'ok', access).others).toEqual(['weighed', 'drawn', 'moved', 'handed-over', 'transferred', 'checked', 'emptied', 'lost', 'labelled', 'received', 'returned', 'exchanged', 'inspected', 'quarantined', 'missing'])
    expect(plannedActs(view, 'ok', { personId: TECHNICIAN, roles: ['auditor'], trainee: false })).toMatchObject({ primary: null, others: [] })
    expect(plannedActs(view, 'ok', null)).toMatchObject({ primary: null, others: [] })
  })
})
