import { z } from 'zod'
import type { FillPolicy } from '../capacity/types'
import type { CylinderRow } from '../custody/cylinderView'
import { CHOICE_PARAGRAPHS } from '../requalification/ownerChoice'
import type { Scale } from '../quantity/scale'
import type { RetestSettings } from '../requalification/retestSettings'
import { eachOnce, id, line } from './parts'

const thousandths = z.number().min(0.01, 'must be at least 0.01').max(1, 'must be at most 1')
  .refine(share => Math.abs(share * 1000 - Math.round(share * 1000)) < 1e-9, 'may have three decimals')
const days = z.number().int('must be whole days').min(1, 'must be at least a day').max(3650, 'must be at most ten years')

const fillValue = z.strictObject({
  share: thousandths,
  ceiling: thousandths,
  options: z.strictObject({ liquid130F: z.boolean(), unRatio: z.boolean() }),
})

const retestValue = z.strictObject({
  soonDays: days,
  notSeenDays: days,
  missingDays: days,
  intervalMonths: z.number().int('must be whole months').min(1).max(600).nullable().default(null),
  ownerChoices: z.array(z.strictObject({
    paragraph: z.enum(CHOICE_PARAGRAPHS),
    reason: line(500),
    from: z.string().regex(/^\d{4}-(0[1-9]|1[0-2])$/, 'must be a month, as 2026-12').nullable(),
  })).max(CHOICE_PARAGRAPHS.length).default([])
    .refine(choices => eachOnce(choices.map(({ paragraph }) => paragraph)), 'each paragraph at most once'),
})

/** Left out: at once. A day begins at midnight in the firm's time zone. */
const from = z.union([z.iso.datetime({ offset: true }), z.iso.date()], 'must be an instant or a day').optional()

const fillDraft = { kind: z.literal('fill-policy'), from, value: fillValue }
const retestDraft = { kind: z.literal('retest'), from, value: retestValue }
const reason = line(500)

/** POST /api/policy/preview: a rule that somebody thinks of setting. */
export const ruleDraft = z.discriminatedUnion('kind', [z.strictObject(fillDraft), z.strictObject(retestDraft)])
export type RuleDraft = z.output<typeof ruleDraft>

/** POST /api/policy: a rule from now on or from a day to come, for a reason. With an id of the sender's own it may be sent twice. */
export const ruleBody = z.discriminatedUnion('kind', [
  z.strictObject({ ...fillDraft, id: id.optional(), reason }),
  z.strictObject({ ...retestDraft, id: id.optional(), reason }),
])
export type NewRule = z.output<typeof ruleBody>

/** POST /api/policy/{id}/withdraw: takes back a rule that has not begun. */
export const withdrawBody = z.strictObject({ reason })

/** A rule of the firm as it was set. Instants: UTC milliseconds. */
export type FirmRule = {
  id: string
  fromAt: number
  reason: string
  setBy: { id: string, name: string }
  setAt: number
  withdrawn: { by: { id: string, name: string }, at: number, reason: string } | null
} & ({ kind: 'fill-policy', value: FillPolicy } | { kind: 'retest', value: RetestSettings })

/** What GET /api/policy answers: the firm's dated rules and what else a screen judges by. */
export interface PolicyAnswer {
  /** When it was told (UTC milliseconds, by the server's clock). */
  asOf: number
  timeZone: string
  /** Oldest first, without those withdrawn; the first is the one before the firm set any. */
  fillPolicies: { fromAt: number, policy: FillPolicy }[]
  /** As the fill policies. */
  retests: { fromAt: number, retest: RetestSettings }[]
  /** In force now. */
  fillPolicy: FillPolicy
  retest: RetestSettings
  /** Everything that was ever set, the newest first. */
  rules: FirmRule[]
  /** Rows of the fleet that do not yet rest on the rules in force; they follow within the minute. */
  rowsBehind: number
  /** Those turned off too: the log names them. */
  scales: (Scale & { active: boolean })[]
}

/** One cylinder that a rule would change, before and after it. */
export interface RuleExample {
  id: string
  labelCode: string | null
  serial: string | null
  refrigerant: string | null
  before: Pick<CylinderRow, 'fillLimitGrams' | 'netGrams' | 'dueMonth'>
  after: Pick<CylinderRow, 'fillLimitGrams' | 'netGrams' | 'dueMonth'>
}

/** So many cylinders, and the first ten of them. */
export interface RuleEffect { count: number, examples: RuleExample[] }

/** What POST /api/policy/preview answers: the fleet as it is, by the rule otherwise in force on that day and by the draft. */
export interface RulePreview {
  /** The day (UTC milliseconds) it is worked out for. */
  at: number
  /** Cylinders in use. */
  cylinders: number
  lowerLimit: RuleEffect
  higherLimit: RuleEffect
  /** A limit now, none by the draft. */
  noLimit: RuleEffect
  /** By today's contents. */
  overfilled: RuleEffect
  noLongerOverfilled: RuleEffect
  /** Room by refrigerant, of cylinders that have some figure by both. */
  room: { refrigerant: string, cylinders: number, beforeGrams: number, afterGrams: number }[]
  /** How many cylinders stand so, by each. */
  retest: Record<'overdue' | 'soon' | 'inDate' | 'unknown' | 'notRequired' | 'notSeen', { before: number, after: number }>
  overdue: RuleEffect
  inDateAgain: RuleEffect
}
