import { DEFAULT_FILL_POLICY, type FillPolicy } from '../capacity/types'
import type { ProblemError } from '../contract/problem'
import type { RuleDraft } from '../contract/policy'

// 49 CFR 180.209, Table 1: 5, 7, 10 or 12 years.
const LONGEST_INTERVAL_MONTHS = 144

/** What a firm may not set, in words beside the field: nothing looser than the rule that holds without it. */
export function ruleFaults(draft: Pick<RuleDraft, 'kind' | 'value'>): ProblemError[] {
  return draft.kind === 'fill-policy' ? fillFaults(draft.value as FillDraftValue) : retestFaults(draft.value as RetestDraftValue)
}

type FillDraftValue = Extract<RuleDraft, { kind: 'fill-policy' }>['value']
type RetestDraftValue = Extract<RuleDraft, { kind: 'retest' }>['value']

function fillFaults({ share, ceiling }: FillDraftValue): ProblemError[] {
  const { shareThousandths, ceilingThousandths } = policyOf({ share, ceiling, options: DEFAULT_FILL_POLICY.options })
  return [
    ...(shareThousandths > DEFAULT_FILL_POLICY.shareThousandths
      ? [{ path: 'value.share', message: 'At most 80 %: AHRI Guideline K fills a recovery cylinder no further. It may only be lowered.' }]
      : []),
    ...(ceilingThousandths > DEFAULT_FILL_POLICY.ceilingThousandths
      ? [{ path: 'value.ceiling', message: 'At most 95 %: 49 CFR 173.304(b) asks that it is never liquid-full at 131 °F, and a scale is not exact. It may only be lowered.' }]
      : []),
    ...(ceilingThousandths < shareThousandths ? [{ path: 'value.ceiling', message: 'Not below the share.' }] : []),
  ]
}

function retestFaults({ notSeenDays, missingDays, intervalMonths }: RetestDraftValue): ProblemError[] {
  return [
    ...(missingDays < notSeenDays ? [{ path: 'value.missingDays', message: 'Not before the day it is looked for.' }] : []),
    ...(intervalMonths !== null && intervalMonths > LONGEST_INTERVAL_MONTHS
      ? [{ path: 'value.intervalMonths', message: 'At most 144 months: no period of 49 CFR 180.209 is longer than 12 years.' }]
      : []),
  ]
}

/** A fill rule as it is kept, from shares as people write them. */
export function policyOf({ share, ceiling, options }: FillDraftValue): FillPolicy {
  return { shareThousandths: Math.round(share * 1000), ceilingThousandths: Math.round(ceiling * 1000), options }
}
