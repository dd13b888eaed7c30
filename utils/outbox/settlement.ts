import type { EventResult } from '../contract/custody'
import type { ProblemDetails } from '../contract/problem'
import type { OutboxEntry } from './entry'
import { unitsOf } from './nextStep'
import { NOT_ITS_AUTHOR } from './notItsAuthor'

/** Why nothing is sent at present: no network, nobody signed in as the author, a server that cannot, or a device that keeps nothing. */
export type Pause = 'offline' | 'sign-in' | 'server' | 'storage'

/**
 * What came back: a body, or the problem of a request that failed as a whole (status 0: not reached); `isOfBetween` where
 * the server did not say it itself, but something on the way to it.
 */
export type Answer = { body: unknown } | { problem: ProblemDetails, isOfBetween?: boolean }

/** What becomes of the entries that were sent. */
export interface Settlement {
  recorded: { id: string, cylinderId: string, version: number }[]
  refused: { id: string, problem: ProblemDetails }[]
  /** These stay and go again; `mayHaveArrived` = an answer that was lost may have recorded them. */
  kept: { id: string, problem: ProblemDetails | null, mayHaveArrived: boolean }[]
  /** null where the sender goes on. */
  pause: Pause | null
  /** The request was refused for what is in it: the next one has fewer events, until the one at fault is found. */
  split: boolean
}

/** Answers to a whole request that lie in what it holds. */
const FOR_ITS_CONTENT: readonly number[] = [400, 413, 422]
/** Of these, what lies in the content whoever says it: a proxy looks at nothing but its size. */
const FOR_ITS_SIZE = 413
/** Answers before anything is recorded. */
const BEFORE_RECORDING: readonly number[] = [...FOR_ITS_CONTENT, 401, 403, 429]

/**
 * What an answer makes of the entries that were sent.
 *
 * Only a verdict on an entry itself takes it out of the outbox; whatever else comes back, it is kept.
 */
export function settlementOf(sent: readonly OutboxEntry[], answer: Answer): Settlement {
  return 'problem' in answer ? ofFailure(sent, answer.problem, answer.isOfBetween ?? false) : ofVerdicts(sent, verdictsIn(answer.body))
}

function ofFailure(sent: readonly OutboxEntry[], problem: ProblemDetails, isOfBetween: boolean): Settlement {
  const isItsContent = problem.status === FOR_ITS_SIZE || (!isOfBetween && FOR_ITS_CONTENT.includes(problem.status))
  if (isItsContent && unitsOf(sent) === 1) {
    return { recorded: [], refused: sent.map(({ id }) => ({ id, problem })), kept: [], pause: null, split: false }
  }
  const mayHaveArrived = !BEFORE_RECORDING.includes(problem.status)
  return {
    recorded: [], refused: [],
    kept: sent.map(({ id }) => ({ id, problem: isItsContent ? null : problem, mayHaveArrived })),
    pause: isItsContent ? null : pauseFor(problem),
    split: isItsContent,
  }
}

function pauseFor({ status, type }: ProblemDetails): Pause {
  if (status === 0) return 'offline'
  return status === 401 || type === NOT_ITS_AUTHOR ? 'sign-in' : 'server'
}

function ofVerdicts(sent: readonly OutboxEntry[], verdicts: ReadonlyMap<string, EventResult>): Settlement {
  const settlement: Settlement = { recorded: [], refused: [], kept: [], pause: null, split: false }
  for (const { id, event: { cylinderId } } of sent) {
    const verdict = verdicts.get(id)
    if (verdict?.outcome === 'refused') settlement.refused.push({ id, problem: verdict.problem! })
    else if (verdict) settlement.recorded.push({ id, cylinderId, version: verdict.version! })
    else settlement.kept.push({ id, problem: null, mayHaveArrived: true })
  }
  return settlement.kept.length > 0 ? { ...settlement, pause: 'server' } : settlement
}

/** The verdicts that can be read; a page of a network that wants its guests to sign in holds none. */
function verdictsIn(body: unknown): Map<string, EventResult> {
  const { results } = Object(body) as { results?: unknown }
  return new Map((Array.isArray(results) ? results : []).filter(isVerdict).map(result => [result.id, result]))
}

function isVerdict(result: unknown): result is EventResult {
  const { id, outcome, version, problem } = Object(result) as Partial<EventResult>
  if (typeof id !== 'string') return false
  if (outcome === 'refused') return typeof problem?.title === 'string' && problem.status < 500
  return (outcome === 'accepted' || outcome === 'duplicate') && Number.isInteger(version)
}
