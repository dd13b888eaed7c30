import { whyNot, type ShipmentStep, type StepFacts } from '~~/utils/shipment/steps'
import { problem } from '../http/problem'

const TITLES: Readonly<Record<ShipmentStep, string>> = {
  change: 'It cannot be changed any more',
  ready: 'It is not ready',
  dispatch: 'Nothing has left',
  arrive: 'It is not on its way',
  return: 'Nothing of it can come back',
  settle: 'It cannot be settled',
  close: 'It cannot be closed',
  cancel: 'It cannot be given up',
}

/** Errors: 409 with each reason where a step may not follow now. */
export function refuseStep(step: ShipmentStep, facts: StepFacts): void {
  const reasons = whyNot(step, facts)
  const [first] = reasons
  if (!first) return
  const isOfTheWhole = reasons.length === 1 && first.line === null
  throw problem(409, TITLES[step], isOfTheWhole ? first.text : 'Settle what is named, or take it off the list with a reason.',
    isOfTheWhole ? undefined : reasons.map(({ line, text }) => ({ path: line === null ? 'shipment' : `lines.${line}`, message: text })), { type: 'held-back' })
}
