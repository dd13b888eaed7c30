import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import PlanCylinderPicture from '~~/components/plan/PlanCylinderPicture.vue'
import PlanStays from '~~/components/plan/PlanStays.vue'
import PlanSteps from '~~/components/plan/PlanSteps.vue'
import type { PlanDetails, PlannedCylinder } from '~~/utils/contract/plans'
import { allByRole } from '../../helpers/roles'

const NOW = Date.UTC(2026, 11, 1, 18)

function cylinder(id: string, changes: Partial<PlannedCylinder>): PlannedCylinder {
  return {
    id, labelCode: null, serial: id, version: 3, place: { id: 'shop', name: 'North shop' }, refrigerant: 'R-22', condition: 'suspect', owner: null, part: 'stays',
    beforeGrams: 4_536, afterGrams: 4_536, limitGrams: 17_272, waterCapacityGrams: 21_591, stopWeightGrams: 29_745, why: [], ...changes,
  }
}

const PLAN: PlanDetails = {
  id: 'plan', number: 3, kind: 'consolidation', state: 'open', madeAt: '2026-12-01T15:00:00Z', madeBy: 'Wes', tasks: 2, tasksDone: 1, freed: 2,
  question: { kind: 'consolidation', useEmpty: false, worseTogether: false },
  answer: {
    summary: [], freed: 2, mostFreed: 2, fewestTransfers: 2, shipments: [],
    transfers: [
      { fromId: 'A1', toId: 'C3', grams: 2_268, isAll: true, why: 'All of it fits.' },
      { fromId: 'B2', toId: 'C3', grams: 4_536, isAll: false, why: 'It goes into 2.' },
    ],
    cylinders: [cylinder('A1', { part: 'emptied', afterGrams: 0 }), cylinder('B2', { part: 'emptied', afterGrams: 0 }), cylinder('C3', { part: 'takes' })],
  },
  steps: [
    { position: 0, kind: 'transfer', fromId: 'A1', toId: 'C3', netGrams: 2_268, isAll: true, done: { eventId: 'e', at: '2026-12-01T17:00:00Z', grams: 2_268, balance: 'unbalanced' } },
    { position: 1, kind: 'transfer', fromId: 'B2', toId: 'C3', netGrams: 4_536, isAll: false, done: null },
  ],
  noLongerFits: [],
}

async function steps(changes: Partial<PlanDetails> = {}, mayRecord = true) {
  return mountSuspended(PlanSteps, { props: { plan: { ...PLAN, ...changes }, unit: 'lb', timeZone: 'America/Chicago', now: NOW, mayRecord } })
}

describe('the steps of a plan', () => {
  it('say how much goes where and the weight to stop at, and of one that is done whether it balances', async () => {
    const list = await steps()
    const [first, second] = allByRole(list.element, 'listitem').map(one => one.textContent!.replace(/\s+/g, ' '))
    expect(first).toMatch(/serial A1\s*into\s*serial C3.*All of it, 5\.0 lb by the log\. Stop at 65\.5 lb gross/)
    expect(first).toMatch(/Does not balance: weigh both again.*Recorded: 5\.0 lb out of it/)
    expect(second).toMatch(/10\.0 lb of it\. Stop at 65\.5 lb/)
  })

  it('lead to the form of what is left, for who may record it and while the plan is open', async () => {
    const links = async (changes: Partial<PlanDetails>, mayRecord: boolean) => allByRole((await steps(changes, mayRecord)).element, 'link', /Record it/).map(one => one.getAttribute('href'))
    expect(await links({}, true)).toEqual(['/c/B2/act/transferred?other=C3&plan=3&grams=4536'])
    expect(await links({}, false)).toEqual([])
    expect(await links({ state: 'dropped' }, true)).toEqual([])
  })
})

it('a cylinder of a plan is drawn before and after, with both figures in words', async () => {
  const picture = await mountSuspended(PlanCylinderPicture, { props: { cylinder: PLAN.answer.cylinders[0]!, unit: 'lb' } })
  expect(picture.text().replace(/\s+/g, ' ')).toMatch(/Before ?10\.0 lb ?After ?0\.0 lb/)
  expect(picture.text()).toContain('comes free')
})

it('cylinders that a plan leaves for one reason stand together under it', async () => {
  const list = await mountSuspended(PlanStays, { props: { cylinders: [
    cylinder('A1', { why: ['Set apart.'] }), cylinder('B2', { why: ['Nothing is in it.'] }), cylinder('C3', { why: ['Nothing is in it.'] }),
  ] } })
  expect(allByRole(list.element, 'listitem').map(one => one.textContent!.replace(/\s+/g, ' ').trim())).toEqual(['Nothing is in it.serial B2serial C3', 'Set apart.serial A1'])
})
