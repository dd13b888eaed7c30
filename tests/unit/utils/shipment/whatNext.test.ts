import { describe, expect, it } from 'vitest'
import { can, type Permission } from '../../../../utils/access/permissions'
import type { Role } from '../../../../utils/access/roles'
import { notShippable } from '../../../../utils/custody/findings/record'
import { whatNext } from '../../../../utils/shipment/whatNext'
import { shipmentLine, shipmentOf, weighed } from '../../../helpers/shipmentLine'

const FRESH = shipmentLine('a', '0YHP9KRRT')
const WEIGHED = shipmentLine('b', '7K3M9Q2TX', { weighed: weighed(50.1) })
const HELD = shipmentLine('c', '4TR8W2HN6', { weighed: weighed(49.9), because: [notShippable('It has no label.')] })

function as(role: Role, shipment: ReturnType<typeof shipmentOf>) {
  const { sentence, act } = whatNext(shipment, (permission: Permission) => can({ personId: 'p', roles: [role], trainee: false }, permission))
  return [sentence, act]
}

describe('what a shipment waits for', () => {
  it('is weighed by the warehouse until every line is, then settled, carried and made ready', () => {
    expect(as('warehouse', shipmentOf([]))).toEqual(['Put the first cylinder on the list.', null])
    expect(as('warehouse', shipmentOf([FRESH]))).toEqual(['1 cylinder is to be scanned and weighed.', 'weigh'])
    expect(as('warehouse', shipmentOf([FRESH, WEIGHED]))).toEqual(['1 of 2 still to be scanned and weighed.', 'weigh'])
    expect(as('warehouse', shipmentOf([WEIGHED, HELD]))).toEqual(['1 may not leave as it stands.', null])
    expect(as('warehouse', shipmentOf([WEIGHED], { carrier: null }))).toEqual(['Say who carries it.', null])
    expect(as('warehouse', shipmentOf([WEIGHED]))).toEqual(['Every line is weighed and may leave.', 'ready'])
  })

  it('is sent off by a manager, and nobody else is offered that', () => {
    const ready = shipmentOf([WEIGHED], { state: 'ready' })
    expect(as('manager', ready)).toEqual(['It is ready to leave.', 'dispatch'])
    expect(as('warehouse', ready)).toEqual(['It is ready to leave. A manager sends it off.', null])
    expect(as('manager', { ...ready, papersLack: ['No emergency telephone is set.'] })).toEqual(['It is ready, and may not leave yet.', null])
  })

  it('is told on the way, settled and closed by a manager, and only read by an auditor', () => {
    const away = { dispatchedAt: '2026-05-01T11:00:00.000Z' }
    expect(as('manager', shipmentOf([WEIGHED], { ...away, state: 'dispatched' }))[1]).toBe('arrive')
    expect(as('manager', shipmentOf([WEIGHED], { ...away, state: 'arrived' }))[1]).toBe('settle')
    expect(as('manager', shipmentOf([WEIGHED], { ...away, state: 'settled' }))[1]).toBe('close')
    for (const state of ['draft', 'ready', 'dispatched', 'arrived', 'settled', 'closed', 'cancelled'] as const) {
      expect(as('auditor', shipmentOf([WEIGHED], { state }))[1], state).toBeNull()
    }
  })

  it('is closed unsettled where all of it came back', () => {
    expect(as('manager', shipmentOf([WEIGHED], { state: 'closed' }))).toEqual(['All of it came back: there is nothing to settle.', null])
    expect(as('manager', shipmentOf([WEIGHED], { state: 'closed', settledAt: '2026-05-09T11:00:00.000Z' }))).toEqual(['Settled and closed.', null])
  })
})
