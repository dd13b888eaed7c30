import type { ChangedLine, SaidAfter } from '../custody/laterLines'
import { CONDITION_WORDS, FINDING_WORDS, KIND_WORDS } from '../custody/words'
import { formatMass, type MassUnit } from '../quantity/mass'

/**
 * What a line said before and says now, each difference as 'before, now after'.
 *
 * @example 'weighed: net 6.00 kg, now 5.50 kg'
 */
export function changedInWords({ kind, before, now }: ChangedLine, unit: MassUnit): string {
  return `${KIND_WORDS[kind].done.toLowerCase()}: ${differencesInWords(before, now, unit).join('; ')}`
}

/** The differences between what was said before and what is said now, each in a few words; none where they are the same. */
export function differencesInWords(before: SaidAfter, now: SaidAfter, unit: MassUnit): string[] {
  const net = (said: SaidAfter) => said.netGrams === null ? 'not known' : formatMass(said.netGrams, unit, 'nearest')
  const raised = now.findings.filter(code => !before.findings.includes(code))
  const ended = before.findings.filter(code => !now.findings.includes(code))
  return [
    ...before.netGrams === now.netGrams ? [] : [`net ${net(before)}, now ${net(now)}`],
    ...before.refrigerant === now.refrigerant ? [] : [`${before.refrigerant ?? 'refrigerant not known'}, now ${now.refrigerant ?? 'not known'}`],
    ...before.condition === now.condition ? [] : [`${CONDITION_WORDS[before.condition]}, now ${CONDITION_WORDS[now.condition]}`],
    ...raised.map(code => `now “${FINDING_WORDS[code]}”`),
    ...ended.map(code => `no longer “${FINDING_WORDS[code]}”`),
  ]
}
