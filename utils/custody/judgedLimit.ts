import { fillLimit } from '../capacity/fillLimit'
import { excessGrams } from '../capacity/stopWeight'
import type { FillPolicy } from '../capacity/types'
import type { Catalogue } from '../refrigerant/types'
import type { CylinderState } from './state'

/** The net that an overfill is judged by: the one known now, else the last that was, unrounded; null where nothing is in it. */
export function judgedNetGrams({ contents }: CylinderState): number | null {
  return contents.nothingInIt ? null : contents.lastKnownNetGrams
}

/**
 * The limit that an overfill is judged by, unrounded; null where none can be known.
 *
 * The rule of the day it was last filled or today's, whichever allows more, but never above today's ceiling. Where the
 * contents cannot be named or have no limit, the lowest of what is known to have gone in since the last deep vacuum.
 */
export function judgedLimitGrams(
  state: CylinderState, policyNow: FillPolicy, policyAt: (ms: number) => FillPolicy, catalogue: Catalogue,
): number | null {
  const { stamp, tare, contents, lastPutInAt } = state
  if (stamp === null || tare === null || contents.nothingInIt) return null
  const policies = lastPutInAt === null ? [policyNow] : [policyNow, underCeilingOf(policyNow, policyAt(lastPutInAt))]
  const limitsOf = (names: readonly string[]) => names.flatMap((refrigerant) => {
    const answers = policies.map(policy => fillLimit({
      stamp, refrigerant, condition: 'suspect', burnt: contents.burnt || contents.condition === 'burnt', policy, catalogue, tareGrams: tare.exactGrams,
    }))
    const known = answers.flatMap(({ exactLimitGrams }) => exactLimitGrams ?? [])
    return known.length === 0 ? [] : [Math.max(...known)]
  })
  const named = contents.condition === 'mixed' || contents.condition === 'unknown' ? null : contents.refrigerant
  const ofPresent = named === null ? [] : limitsOf([named])
  const limits = ofPresent.length > 0 ? ofPresent : limitsOf(contents.knownSinceVacuum)
  return limits.length === 0 ? null : Math.min(...limits)
}

function underCeilingOf(policyNow: FillPolicy, policy: FillPolicy): FillPolicy {
  return { ...policy, ceilingThousandths: Math.min(policy.ceilingThousandths, policyNow.ceilingThousandths) }
}

/**
 * By how much a cylinder is overfilled, in grams: 0 where it is not, null where it was and no weight or limit tells now.
 *
 * A stop never ends because a number became unknown.
 */
export function overfillGrams(state: CylinderState, limitGrams: number | null): number | null {
  const net = judgedNetGrams(state)
  if (net === null) return 0
  if (limitGrams === null) return state.overfilledAt === null ? 0 : null
  return excessGrams(limitGrams, net)
}
