import { setTimeout as wait } from 'node:timers/promises'
import type { EventsAnswer } from '../../utils/contract/custody'
import type { TestClient } from './client'

/** An event as it is sent. */
export type Sent = { id: string } & Record<string, unknown>

/** A phone that records one thing after another, and sends each again, under the same ids, until it is answered. */
export interface Phone {
  /** Ids that the server has acknowledged. */
  acknowledged: string[]
  /** How many of them were answered `duplicate`: an answer before had been lost. */
  repeated: () => number
  /** Rejects where it was answered otherwise than it should. */
  ended: Promise<void>
  /** Resolves once what it holds is delivered. */
  switchOff: () => Promise<void>
}

const AGAIN_MS = 20

/** @param next what the phone records next, all in one request. */
export function phone(client: TestClient, next: () => Sent[]): Phone {
  const acknowledged: string[] = []
  let repeated = 0
  let isOn = true

  async function deliver(events: Sent[]): Promise<void> {
    for (;;) {
      const answer = await client.post<EventsAnswer>('/api/events', { events }).catch(() => null)
      if (answer === null) {
        await wait(AGAIN_MS)
        continue
      }
      const outcomes = answer.status === 200 ? answer.body.results.map(({ outcome }) => outcome) : []
      if (outcomes.length !== events.length || outcomes.includes('refused')) throw new Error(`A phone was answered ${answer.status}: ${JSON.stringify(answer.body)}`)
      acknowledged.push(...events.map(({ id }) => id))
      repeated += outcomes.filter(outcome => outcome === 'duplicate').length
      return
    }
  }
  async function work(): Promise<void> {
    while (isOn) await deliver(next())
  }

  const ended = work()
  return {
    acknowledged,
    repeated: () => repeated,
    ended,
    switchOff() {
      isOn = false
      return ended
    },
  }
}
