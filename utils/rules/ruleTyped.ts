import type { FillPolicy } from '../capacity/types'
import type { ProblemError } from '../contract/problem'
import type { RuleDraft } from '../contract/policy'
import { parseFigure } from '../quantity/figure'
import { isMonth } from '../quantity/month'
import { CHOICE_PARAGRAPHS, type ChoiceParagraph } from '../requalification/ownerChoice'
import type { RetestSettings } from '../requalification/retestSettings'
import { ruleFaults } from './ruleFaults'

/** A fill rule as it is typed: shares in percent. */
export interface FillTyped { share: string, ceiling: string, options: FillPolicy['options'] }

/** Retest settings as they are typed; an empty period is none. */
export interface RetestTyped {
  soonDays: string
  notSeenDays: string
  missingDays: string
  intervalMonths: string
  choices: Record<ChoiceParagraph, { on: boolean, reason: string, from: string }>
}

/** What came of reading what was typed: a rule, or what is wrong with it beside each field. */
export type RuleRead = { draft: Pick<RuleDraft, 'kind' | 'value'>, faults: [] } | { draft: null, faults: ProblemError[] }

/** The fields of a fill rule, filled with the one in force. */
export function typedFill({ shareThousandths, ceilingThousandths, options }: FillPolicy): FillTyped {
  return { share: String(shareThousandths / 10), ceiling: String(ceilingThousandths / 10), options: { ...options } }
}

/** The fields of the retest settings, filled with those in force. */
export function typedRetest({ soonDays, notSeenDays, missingDays, intervalMonths, ownerChoices }: RetestSettings): RetestTyped {
  const choice = (paragraph: ChoiceParagraph) => {
    const chosen = ownerChoices.find(one => one.paragraph === paragraph)
    return { on: chosen !== undefined, reason: chosen?.reason ?? '', from: chosen?.from ?? '' }
  }
  return {
    soonDays: String(soonDays),
    notSeenDays: String(notSeenDays),
    missingDays: String(missingDays),
    intervalMonths: intervalMonths === null ? '' : String(intervalMonths),
    choices: Object.fromEntries(CHOICE_PARAGRAPHS.map(paragraph => [paragraph, choice(paragraph)])) as RetestTyped['choices'],
  }
}

/** Reads a fill rule from its fields. */
export function readFill(typed: FillTyped): RuleRead {
  const [share, ceiling] = [percentOf(typed.share), percentOf(typed.ceiling)]
  const faults = [
    ...(share === null ? [{ path: 'value.share', message: 'A percentage from 1 to 80, with one decimal at most.' }] : []),
    ...(ceiling === null ? [{ path: 'value.ceiling', message: 'A percentage from 1 to 95, with one decimal at most.' }] : []),
  ]
  if (share === null || ceiling === null) return { draft: null, faults }
  return judged({ kind: 'fill-policy', value: { share, ceiling, options: { ...typed.options } } })
}

/** Reads retest settings from their fields. */
export function readRetest(typed: RetestTyped): RuleRead {
  const [soonDays, notSeenDays, missingDays] = [wholeOf(typed.soonDays), wholeOf(typed.notSeenDays), wholeOf(typed.missingDays)]
  const intervalMonths = typed.intervalMonths.trim() === '' ? null : wholeOf(typed.intervalMonths)
  const chosen = CHOICE_PARAGRAPHS.filter(paragraph => typed.choices[paragraph].on)
  const faults = [
    ...Object.entries({ soonDays, notSeenDays, missingDays }).flatMap(([name, value]) => value === null ? [{ path: `value.${name}`, message: 'A number of whole days.' }] : []),
    ...(typed.intervalMonths.trim() !== '' && intervalMonths === null ? [{ path: 'value.intervalMonths', message: 'A number of whole months, or nothing.' }] : []),
    ...chosen.flatMap(paragraph => choiceFaults(paragraph, typed.choices[paragraph])),
  ]
  if (faults.length > 0 || soonDays === null || notSeenDays === null || missingDays === null) return { draft: null, faults }
  const ownerChoices = chosen.map((paragraph) => {
    const { reason, from } = typed.choices[paragraph]
    return { paragraph, reason: reason.trim(), from: from === '' ? null : from }
  })
  return judged({ kind: 'retest', value: { soonDays, notSeenDays, missingDays, intervalMonths, ownerChoices } })
}

function choiceFaults(paragraph: ChoiceParagraph, { reason, from }: { reason: string, from: string }): ProblemError[] {
  return [
    ...(reason.trim() === '' ? [{ path: `choices.${paragraph}.reason`, message: 'Say how it is known that your cylinders meet this.' }] : []),
    ...(from !== '' && !isMonth(from) ? [{ path: `choices.${paragraph}.from`, message: 'A month, or nothing.' }] : []),
  ]
}

function judged(draft: Pick<RuleDraft, 'kind' | 'value'>): RuleRead {
  const faults = ruleFaults(draft)
  return faults.length === 0 ? { draft, faults: [] } : { draft: null, faults }
}

/** The share that a percentage is; null where it is none, or finer than a tenth of a percent. */
function percentOf(text: string): number | null {
  const parsed = parseFigure(text)
  if (!('value' in parsed)) return null
  const thousandths = Math.round(parsed.value * 10)
  return Math.abs(thousandths - parsed.value * 10) < 1e-9 && thousandths >= 10 && thousandths <= 1000 ? thousandths / 1000 : null
}

function wholeOf(text: string): number | null {
  const parsed = parseFigure(text)
  return 'value' in parsed && Number.isInteger(parsed.value) && parsed.value >= 1 && parsed.value <= 3650 ? parsed.value : null
}
