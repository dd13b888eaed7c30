import type { Permission } from '../access/permissions'
import type { ShipmentWithLines } from '../contract/shipments'
import { lineWant, stepFacts, whyNot, type ShipmentStep, type StepReason } from './steps'

/** What a shipment waits for, and what the person looking at it may do about it. */
export interface WhatNext {
  sentence: string
  /** What the person may do now; null where nothing, or where it is done elsewhere on the page. */
  act: 'weigh' | ShipmentStep | null
  /** Why the step that comes next may not follow yet. */
  because: StepReason[]
}

/** What a shipment waits for next, for a person with these permissions. */
export function whatNext(shipment: ShipmentWithLines, mayI: (permission: Permission) => boolean): WhatNext {
  const facts = stepFacts(shipment)
  switch (shipment.state) {
    case 'draft': return preparing(shipment, mayI('shipments:prepare'), whyNot('ready', facts))
    case 'ready': return leaving(mayI('shipments:dispatch'), whyNot('dispatch', facts))
    case 'dispatched': return done(
      `On its way to ${shipment.to.name}. It counts as arrived from the dock’s first entry on, or once you say so.`, mayI('shipments:receive') ? 'arrive' : null)
    case 'arrived': return done(`${shipment.to.name} has it. Its weights and grades settle it.`, mayI('shipments:receive') ? 'settle' : null)
    case 'settled': return done('It is settled. Once no dispute is open it is closed.', mayI('shipments:receive') ? 'close' : null)
    case 'closed': return done(shipment.settledAt === null ? 'All of it came back: there is nothing to settle.' : 'Settled and closed.', null)
    case 'cancelled': return done('Given up before it left; its cylinders are free.', null)
  }
}

function preparing({ lines }: ShipmentWithLines, mayPrepare: boolean, because: StepReason[]): WhatNext {
  const toWeigh = lines.filter(line => lineWant(line)?.startsWith('weighing')).length
  const held = lines.filter(line => lineWant(line) === 'settling').length
  const who = mayPrepare ? '' : ' The warehouse sees to it.'
  if (lines.length === 0) return { sentence: `Put the first cylinder on the list.${who}`, act: null, because: [] }
  if (toWeigh > 0) {
    const sentence = toWeigh === lines.length ? `${counted(lines.length)} to be scanned and weighed.` : `${toWeigh} of ${lines.length} still to be scanned and weighed.`
    return { sentence: sentence + who, act: mayPrepare ? 'weigh' : null, because }
  }
  if (held > 0) return { sentence: `${held === 1 ? '1 may' : `${held} may`} not leave as ${held === 1 ? 'it stands' : 'they stand'}.${who}`, act: null, because }
  if (because.length > 0) return { sentence: `Say who carries it.${who}`, act: null, because }
  return { sentence: `Every line is weighed and may leave.${who}`, act: mayPrepare ? 'ready' : null, because: [] }
}

function leaving(mayDispatch: boolean, because: StepReason[]): WhatNext {
  if (because.length > 0) return { sentence: 'It is ready, and may not leave yet.', act: null, because }
  return { sentence: mayDispatch ? 'It is ready to leave.' : 'It is ready to leave. A manager sends it off.', act: mayDispatch ? 'dispatch' : null, because }
}

function done(sentence: string, act: WhatNext['act']): WhatNext {
  return { sentence, act, because: [] }
}

function counted(count: number): string {
  return count === 1 ? '1 cylinder is' : `${count} cylinders are`
}
