import { answerWithin } from '~~/composables/answerWithin'
import type { OutboxBox } from '~~/composables/outboxBox'
import { isProblem, problemOf } from '~~/composables/useApi'
import { MOST_EVENTS } from '~~/utils/contract/mostEvents'
import type { CustodyEvent } from '~~/utils/custody/event'
import type { OutboxEntry } from '~~/utils/outbox/entry'
import { nextStep, type Step } from '~~/utils/outbox/nextStep'
import { settlementOf, type Answer, type Pause, type Settlement } from '~~/utils/outbox/settlement'

/** Where the sender has come to an end: nothing to send, something to wait for, or no way on at present. */
export type Ended = Exclude<Step, { is: 'send' }> | { is: 'paused', pause: Pause }

/** What one request came to. */
export interface Told { settlement: Settlement, answer: Answer }

const LOCK = 'collarbook-outbox-sender'
/** An answer that takes longer counts as none: the events wait, and the form does not. */
const ANSWER_WITHIN_MS = 15_000

let ownTurn: Promise<unknown> = Promise.resolve()

/**
 * Sends what one person has in the outbox, in order, until nothing is left or there is no way on.
 *
 * Of all tabs one sends at a time. What was sent is marked before, so that a crash leaves it to be sent again: the server
 * answers `duplicate` to what it has.
 *
 * Shape: `told` hears of each request as soon as it is settled on the device.
 */
export function sendOutbox(
  box: OutboxBox, personId: string, given: { byHand: boolean, deviceNow: () => string, told: (told: Told) => void },
): Promise<Ended> {
  return alone(async () => {
    let most = MOST_EVENTS
    for (;;) {
      const step = nextStep(await box.all(), { personId, nowMs: Date.now(), most, byHand: given.byHand })
      if (step.is !== 'send') return step
      const going = await box.sending(step.entries.map(({ id }) => id), Date.now())
      if (going.length === 0) continue
      const answer = await post(going, personId, given.deviceNow())
      const settlement = settlementOf(going, answer)
      await box.settle(going, settlement, Date.now())
      given.told({ settlement, answer })
      if (settlement.pause) return { is: 'paused', pause: settlement.pause }
      most = settlement.split ? Math.max(1, Math.floor(going.length / 2)) : MOST_EVENTS
    }
  })
}

async function post(entries: readonly OutboxEntry[], author: string, deviceNow: string): Promise<Answer> {
  const events: CustodyEvent[] = entries.map(({ event }) => event)
  try {
    return {
      body: await answerWithin(ANSWER_WITHIN_MS, signal =>
        $fetch<unknown>('/api/events', { method: 'POST', body: { events, deviceNow, author }, retry: false, signal })),
    }
  }
  catch (error) {
    return { problem: problemOf(error), isOfBetween: !isProblem(Object(error).data) }
  }
}

/** One at a time among all tabs; where the browser has no locks, among all of this one. */
function alone<T>(work: () => Promise<T>): Promise<T> {
  if (typeof navigator !== 'undefined' && navigator.locks) return navigator.locks.request(LOCK, work) as Promise<T>
  const turn = ownTurn.then(work, work)
  ownTurn = turn.catch(() => {})
  return turn
}
