import type { FillPolicy } from '../capacity/types'
import type { RetestSettings } from '../requalification/retestSettings'
import type { FirmRule } from '../contract/policy'

/** An option of the fill rule: its name, what it is for, and where it is from. */
export interface OptionWords { name: string, hint: string }

/** The options of the fill rule in words. */
export const OPTION_WORDS: Readonly<Record<keyof FillPolicy['options'], OptionWords>> = {
  liquid130F: {
    name: 'Hot van',
    hint: 'Also at most 80 % of the volume as liquid at 130 °F, for cylinders that ride or stand in the heat. Taught in the trade; no standard found.',
  },
  unRatio: {
    name: 'UN filling ratio',
    hint: 'Also the lower of 95 % liquid at 50 °C and liquid-full at 60 °C, as in metric regions: 49 CFR 173.304b(b). A refrigerant without a figure at 60 °C then has no stop weight.',
  },
}

/** A line of a rule: what it sets, and how; a figure or a word. */
export interface RuleLine { term: string, value: string, figure?: boolean }

/** A fill rule line by line. */
export function fillRuleLines({ shareThousandths, ceilingThousandths, options }: FillPolicy): RuleLine[] {
  return [
    { term: 'Share of the cylinder', value: percent(shareThousandths), figure: true },
    { term: 'Liquid at 131 °F, at most', value: percent(ceilingThousandths), figure: true },
    ...optionNames.map(name => ({ term: OPTION_WORDS[name].name, value: options[name] ? 'on' : 'off' })),
  ]
}

/** Retest settings line by line. */
export function retestRuleLines({ soonDays, notSeenDays, missingDays, intervalMonths, ownerChoices }: RetestSettings): RuleLine[] {
  return [
    { term: 'Days ahead: retest due soon', value: String(soonDays), figure: true },
    { term: 'Days not seen: look for it', value: String(notSeenDays), figure: true },
    { term: 'Days not seen: missing?', value: String(missingDays), figure: true },
    intervalMonths === null
      ? { term: 'Longest period of our own', value: 'none' }
      : { term: 'Longest period of our own, months', value: String(intervalMonths), figure: true },
    { term: 'Test choices', value: ownerChoices.length === 0 ? 'none' : ownerChoices.map(({ paragraph }) => paragraph).join(', ') },
  ]
}

/** A rule in one line, for the history. @example 'share 80 %, liquid 95 % at 131 °F, hot van' */
export function ruleInShort(rule: FirmRule): string {
  if (rule.kind === 'fill-policy') {
    const { shareThousandths, ceilingThousandths, options } = rule.value
    const on = optionNames.filter(name => options[name]).map(name => OPTION_WORDS[name].name)
    return [`share ${percent(shareThousandths)}`, `liquid ${percent(ceilingThousandths)} at 131 °F`, ...on].join(', ')
  }
  const { soonDays, notSeenDays, missingDays, intervalMonths, ownerChoices } = rule.value
  return [
    `soon ${soonDays} d`, `not seen ${notSeenDays} d`, `missing ${missingDays} d`,
    ...(intervalMonths === null ? [] : [`${intervalMonths} months at most`]), ...ownerChoices.map(({ paragraph }) => paragraph),
  ].join(', ')
}

/** Thousandths as people say them. @example percent(775) // '77.5 %' */
export function percent(thousandths: number): string {
  return `${thousandths / 10} %`
}

const optionNames = Object.keys(OPTION_WORDS) as (keyof FillPolicy['options'])[]
