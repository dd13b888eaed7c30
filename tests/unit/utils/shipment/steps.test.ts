import { describe, expect, it } from 'vitest'
import { SHIPMENT_STATES } from '../../../../utils/contract/shipments'
import { notShippable } from '../../../../utils/custody/findings/record'
import { lineWant, stepFacts, whyNot, type ShipmentStep } from '../../../../utils/shipment/steps'
import { shipmentLine, shipmentOf, weighed } from '../../../helpers/shipmentLine'

const WEIGHED = shipmentLine('a', '0YHP9KRRT', { weighed: weighed(50.1) })
const STALE = shipmentLine('b', '7K3M9Q2TX', { weighed: weighed(49.9, { isStale: true }) })
const HELD = shipmentLine('c', '4TR8W2HN6', { weighed: weighed(49.9), because: [notShippable('It has no label.')] })

const reasons = (step: ShipmentStep, shipment: ReturnType<typeof shipmentOf>) => whyNot(step, stepFacts(shipment)).map(({ line, text }) => [line, text])

describe('the step that may follow in the life of a shipment', () => {
  it.each<[ShipmentStep, string[]]>([
    ['change', ['draft', 'ready']],
    ['ready', ['draft']],
    ['dispatch', ['ready']],
    ['arrive', ['dispatched']],
    ['return', ['dispatched', 'arrived']],
    ['settle', ['dispatched', 'arrived']],
    ['close', ['settled']],
    ['cancel', ['draft', 'ready']],
  ])('lets it %s from %j and from nowhere else', (step, from) => {
    expect(SHIPMENT_STATES.filter(state => whyNot(step, stepFacts(shipmentOf([WEIGHED], { state }))).length === 0)).toEqual(from)
  })

  it('is not ready with no cylinder, an unweighed one, one to be weighed again or one that is held back', () => {
    expect(reasons('ready', shipmentOf([]))).toEqual([[null, 'No cylinder is on it.']])
    expect(reasons('ready', shipmentOf([WEIGHED, shipmentLine('b', '7K3M9Q2TX')]))).toEqual([[1, '7K3 M9Q 2TX is not scanned and weighed yet.']])
    expect(reasons('ready', shipmentOf([STALE]))).toEqual([[0, 'Something was recorded of 7K3 M9Q 2TX since it was weighed. Weigh it again.']])
    expect(reasons('ready', shipmentOf([WEIGHED, HELD]))).toEqual([[1, 'It has no label.']])
  })

  it('is not ready before somebody has said who carries it; our own vehicle is somebody', () => {
    expect(reasons('ready', shipmentOf([WEIGHED], { carrier: null }))).toEqual([[null, 'Nobody has said who carries it.']])
    expect(reasons('ready', shipmentOf([WEIGHED], { carrier: { id: null, name: 'our own vehicle' } }))).toEqual([])
  })

  it('does not leave while its papers lack something, though it is ready', () => {
    expect(reasons('ready', shipmentOf([WEIGHED], { papersLack: ['No emergency telephone is set.'] }))).toEqual([])
    expect(reasons('dispatch', shipmentOf([WEIGHED], { state: 'ready', papersLack: ['No emergency telephone is set.'] }))).toEqual([[null, 'No emergency telephone is set.']])
  })

  it('is not given up once it has left: what left can only come back', () => {
    expect(reasons('cancel', shipmentOf([WEIGHED], { state: 'dispatched' }))).toEqual([
      [null, 'It has left. What has left can only come back: record each cylinder as it returns.'],
    ])
  })
})

describe('what a prepared line still wants', () => {
  it('is weighed first, then again after anything new, and only then settled', () => {
    expect([shipmentLine('b', '7K3M9Q2TX', { because: HELD.because }), { ...HELD, weighed: STALE.weighed }, HELD, WEIGHED].map(lineWant))
      .toEqual(['weighing', 'weighing-again', 'settling', null])
  })
})
