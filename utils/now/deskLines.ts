import { daysBetween, formatNear } from '../quantity/instant'
import { formatMass } from '../quantity/mass'
import { formatMoney } from '../reclaim/price'
import { MATERIALS_OF_TRADE } from '../transport/vanLoad'
import { cylinderName } from '../shipment/changedLines'
import { shipmentName } from '../shipment/shipmentName'
import { FEW_EMPTY, type FewEmptyFacts, type FullFacts, type ListFacts, type NowFacts, type PlanFacts, type ShortVanFacts, type VanFacts, type WorthFacts } from './nowFacts'
import type { DraftLine, NowReader } from './nowLines'
import { counted, listed } from './phrase'

/** The lines about what is aboard, full or lacking in the shop, on lists, and without a label. */
export function deskLines(facts: NowFacts, reader: NowReader): DraftLine[] {
  const { vans = [], shortVans = [], full = [], worthPickUp, fewEmpty = [], unlabelled, shipmentsReady, shipmentsAway, lotsAway, plansOpen, shipmentDrafts, lotDrafts } = facts
  return [
    ...vans.map(van => vanLine(van, vans.length === 1, reader)),
    shortVansLine(shortVans, reader),
    ...full.map(one => fullLine(one, reader)),
    worthPickUp && worthLine(worthPickUp, reader),
    fewEmptyLine(fewEmpty),
    shipmentsReady && readyLine(shipmentsReady, reader),
    shipmentsAway && awayLine('shipments-away', shipmentsAway, reader),
    lotsAway && awayLine('lots-away', lotsAway, reader),
    plansOpen && planLine(plansOpen),
    shipmentDrafts && draftLine('shipment-drafts', shipmentDrafts, reader),
    lotDrafts && draftLine('lot-drafts', lotDrafts, reader),
    unlabelled && unlabelledLine(unlabelled),
  ].filter(line => !!line)
}

function vanLine({ id, name, load }: VanFacts, isOnly: boolean, { unit }: NowReader): DraftLine | null {
  const shared = { topic: 'van-load', kind: 'att', verb: 'See what is aboard', ...isOnly ? { to: '/van' } : { which: id, to: `/vans/${id}` } } as const
  if (load.isOver) {
    return {
      ...shared, number: 1,
      sentence: `${name} carries ${formatMass(-load.leftGrams, unit, 'up')} too much.`,
      reason: `More than ${formatMass(MATERIALS_OF_TRADE.togetherGrams, unit, 'nearest')} gross does not go without a shipping paper (${MATERIALS_OF_TRADE.source}(d)).`,
    }
  }
  if (load.tooHeavy === 0) return null
  return {
    ...shared, number: load.tooHeavy,
    sentence: `${counted(load.tooHeavy, 'cylinder', 'cylinders')} on ${name} ${load.tooHeavy === 1 ? 'is' : 'are'} too heavy.`,
    reason: `One above ${formatMass(MATERIALS_OF_TRADE.eachGrams, unit, 'nearest')} gross does not go without a shipping paper (${MATERIALS_OF_TRADE.source}(a)(2)).`,
  }
}

function shortVansLine(vans: readonly ShortVanFacts[], { now, timeZone }: NowReader): DraftLine | null {
  const [van] = vans
  if (!van) return null
  const number = vans.reduce((sum, { names }) => sum + names.length, 0)
  return {
    topic: 'vans-short', kind: 'unk', number,
    sentence: `${vans.length === 1 ? van.name : `${vans.length} vans`} came back ${number} short.`,
    reason: `${vans.map(({ name, names, checkedAt }) => `${listed(names)} not found on ${name} ${formatNear(checkedAt, timeZone, now)}`).join('; ')}. Not seen since.`,
    verb: 'See what to look for', to: vans.length === 1 ? `/vans/${van.id}` : '/vans',
  }
}

function fewEmptyLine(shops: readonly FewEmptyFacts[]): DraftLine | null {
  const [shop] = shops
  if (!shop) return null
  const few = `Fewer than ${FEW_EMPTY} leave little to recover into: evacuate some, or have some come back.`
  return {
    topic: 'few-empty', kind: 'att', number: shops.length,
    ...shops.length === 1
      ? { sentence: `${shop.name} has ${counted(shop.count, 'empty cylinder', 'empty cylinders')} that may be filled.`, reason: few, verb: 'See what stands there', to: `/fleet?place=${shop.id}` }
      : { sentence: `${shops.length} shops have few empty cylinders.`, reason: `${listed(shops.map(({ name, count }) => `${name} ${count}`))} that may be filled. ${few}`, verb: 'See the places', to: '/places' },
  }
}

function fullLine({ refrigerant, netGrams, ids, places }: FullFacts, { unit }: NowReader): DraftLine {
  return {
    topic: 'full', which: refrigerant, kind: 'att', number: ids.length,
    sentence: `${ids.length} full, ready to ship.`,
    reason: `${formatMass(netGrams, unit, 'nearest')} of ${refrigerant} in ${listed(places)}.`,
    verb: 'Start a shipment', to: `/shipments?with=${ids.join(',')}`,
  }
}

function worthLine({ firm, place, refrigerant, cylinders, netGrams, comesToCents }: WorthFacts, { unit }: NowReader): DraftLine {
  const what = refrigerant === null ? `${formatMass(netGrams, unit, 'nearest')} in ${counted(cylinders, 'cylinder', 'cylinders')} are` : `${formatMass(netGrams, unit, 'nearest')} of ${refrigerant} are`
  return {
    topic: 'worth-pick-up', kind: 'att', number: cylinders,
    sentence: `${what} worth a pick-up.`,
    reason: `${firm} would take ${counted(cylinders, 'cylinder', 'cylinders')} from ${place}${comesToCents === null ? '' : `, for ${formatMoney(comesToCents)} after the pick-up`}.`,
    verb: 'See what is worth it', to: '/reclaim',
  }
}

function readyLine({ count, id, number, since }: ListFacts, { now, timeZone }: NowReader): DraftLine {
  return {
    topic: 'shipments-ready', kind: 'att', number: count,
    sentence: `${counted(count, 'shipment is', 'shipments are')} ready to leave.`,
    reason: `${shipmentName({ number })} was made ready ${formatNear(since, timeZone, now)}. It is sent off by a manager.`,
    ...(count === 1 ? { verb: 'Send it off', to: `/shipments/${id}` } : { verb: `Show the ${count}`, to: '/shipments?state=ready' }),
  }
}

function awayLine(topic: 'shipments-away' | 'lots-away', { count, id, number, since }: ListFacts, { now, timeZone, mayI }: NowReader): DraftLine {
  const isShipment = topic === 'shipments-away'
  const thing = isShipment ? counted(count, 'shipment has', 'shipments have') : counted(count, 'test lot is', 'test lots are')
  const mayClear = mayI(isShipment ? 'shipments:receive' : 'lots:receive')
  return {
    topic, kind: 'att', number: count,
    sentence: isShipment ? `${thing} no settlement yet.` : `${thing} not back yet.`,
    reason: `${isShipment ? shipmentName({ number }) : `Test lot ${number}`} left ${daysBetween(since, now, timeZone)} days ago. Ask where it is${mayClear ? ', or record what came back' : ''}.`,
    ...(count === 1
      ? { verb: mayClear ? (isShipment ? 'Settle it' : 'Record the results') : 'Open it', to: isShipment ? `/shipments/${id}${mayClear ? '/settlement' : ''}` : `/retests/${id}` }
      : { verb: `Show the ${count}`, to: isShipment ? '/shipments' : '/retests' }),
  }
}

function planLine({ id, number, plans, steps }: PlanFacts): DraftLine {
  return {
    topic: 'plan-steps', kind: 'att', number: steps,
    sentence: `${counted(steps, 'transfer is', 'transfers are')} planned that ${steps === 1 ? 'frees a cylinder' : 'free cylinders'}.`,
    reason: plans === 1 ? `Plan ${number} is open. Its cylinders are on no other plan meanwhile.` : `${plans} plans are open, the oldest is plan ${number}.`,
    ...plans === 1 ? { verb: 'Open the plan', to: `/plans/${id}` } : { verb: 'Show the plans', to: '/plans' },
  }
}

function draftLine(topic: 'shipment-drafts' | 'lot-drafts', { count, id, number, since }: ListFacts, { now, timeZone }: NowReader): DraftLine {
  const isShipment = topic === 'shipment-drafts'
  return {
    topic, kind: 'att', number: count,
    sentence: isShipment ? `${counted(count, 'shipment is a draft', 'shipments are drafts')} still.` : `${counted(count, 'test lot is a draft', 'test lots are drafts')} still.`,
    reason: `${isShipment ? shipmentName({ number }) : `Test lot ${number}`} was begun ${formatNear(since, timeZone, now)}. Its cylinders can go on no other list.`,
    ...(count === 1
      ? { verb: 'Go on with it', to: `/${isShipment ? 'shipments' : 'retests'}/${id}` }
      : { verb: `Show the ${count}`, to: isShipment ? '/shipments?state=draft' : '/retests' }),
  }
}

function unlabelledLine({ count, first }: NonNullable<NowFacts['unlabelled']>): DraftLine {
  const names = first.map(row => [cylinderName({ ...row, labelCode: null }), row.place?.name].filter(Boolean).join(', '))
  return {
    topic: 'unlabelled', kind: 'att', number: count,
    sentence: `${counted(count, 'cylinder wears', 'cylinders wear')} no label.`,
    reason: `${names[0] ?? ''}. Without one it is found by its serial alone and may not be shipped.`,
    verb: count === 1 ? 'Label it' : first.length < count ? `Label the first ${first.length}` : `Label the ${count}`,
    to: `/labels?cylinders=${first.map(({ id }) => id).join(',')}`,
  }
}
