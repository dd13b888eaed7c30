import type { VerifyScope } from '../../../utils/contract/log'
import { keepVerification, lastVerification } from '../custody/lastVerification'
import type { Database } from '../database/database'
import { comparingCaches } from './compareCaches'
import { sealing } from './sealing'
import { verifying, type VerifySteps } from './verifyLog'

/**
 * Verifies as much as is asked for; where nothing was verified before, all of it. Of the log itself it is kept when that
 * was and with what result.
 */
export async function* verifyScope(db: Database, scope: VerifyScope, now: number): VerifySteps {
  if (scope === 'caches') return yield* comparingCaches(db, now)
  const since = scope === 'since' ? (await lastVerification(db))?.goodUpTo ?? null : null
  const result = yield* verifying(db, { now, sealing: await sealing(db), since })
  await keepVerification(db, result)
  return result
}

/** Lines of JSON: how far it has come, in the end `{ "result": … }`. */
export async function* withProgress(steps: VerifySteps): AsyncGenerator<string> {
  for (;;) {
    const step = await steps.next()
    yield `${JSON.stringify(step.done ? { result: step.value } : step.value)}\n`
    if (step.done) return
  }
}
