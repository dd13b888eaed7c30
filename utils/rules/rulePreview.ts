import type { RuleEffect, RuleExample, RulePreview } from '../contract/policy'
import type { CylinderRow } from '../custody/cylinderView'

/** Adds up what a rule would change, cylinder by cylinder. */
export interface RulePreviewSum {
  /** One cylinder by the rule otherwise in force and by the draft, on the same day. */
  take: (before: CylinderRow, after: CylinderRow) => void
  answer: () => RulePreview
}

type Standing = keyof RulePreview['retest']
type EffectName = 'lowerLimit' | 'higherLimit' | 'noLimit' | 'overfilled' | 'noLongerOverfilled' | 'overdue' | 'inDateAgain'

const EXAMPLES = 10
const ENDED: readonly CylinderRow['lifecycle'][] = ['condemned', 'retired']

/** An empty sum for the day (UTC milliseconds) that the rule would begin. Cylinders that have ended count for nothing. */
export function newRulePreview(at: number): RulePreviewSum {
  let cylinders = 0
  const room = new Map<string, { cylinders: number, beforeGrams: number, afterGrams: number }>()
  const retest: RulePreview['retest'] = {
    overdue: none(), soon: none(), inDate: none(), unknown: none(), notRequired: none(), notSeen: none(),
  }
  const effects = Object.fromEntries(EFFECTS.map(({ name }) => [name, new Effect()])) as Record<EffectName, Effect>

  function take(before: CylinderRow, after: CylinderRow): void {
    if (ENDED.includes(before.lifecycle)) return
    cylinders++
    for (const standing of standingsOf(before)) retest[standing].before++
    for (const standing of standingsOf(after)) retest[standing].after++
    for (const { name, weight } of EFFECTS) effects[name].take(before, after, weight(before, after))
    if (before.refrigerant !== null && before.roomGrams !== null && after.roomGrams !== null) {
      const sum = room.get(before.refrigerant) ?? { cylinders: 0, beforeGrams: 0, afterGrams: 0 }
      // An overfilled cylinder has no room, but takes none from the others either.
      room.set(before.refrigerant, {
        cylinders: sum.cylinders + 1,
        beforeGrams: sum.beforeGrams + Math.max(0, before.roomGrams),
        afterGrams: sum.afterGrams + Math.max(0, after.roomGrams),
      })
    }
  }

  function answer(): RulePreview {
    return {
      at,
      cylinders,
      ...Object.fromEntries(EFFECTS.map(({ name }) => [name, effects[name].answer()])) as Record<EffectName, RuleEffect>,
      room: [...room].map(([refrigerant, sum]) => ({ refrigerant, ...sum })).sort((a, b) => a.refrigerant.localeCompare(b.refrigerant, 'en')),
      retest,
    }
  }

  return { take, answer }
}

/** How much a cylinder counts in an effect: null where it is not among it; the heaviest stand first. */
const EFFECTS: readonly { name: EffectName, weight: (before: CylinderRow, after: CylinderRow) => number | null }[] = [
  { name: 'lowerLimit', weight: (before, after) => positive(difference(before.fillLimitGrams, after.fillLimitGrams)) },
  { name: 'higherLimit', weight: (before, after) => positive(difference(after.fillLimitGrams, before.fillLimitGrams)) },
  { name: 'noLimit', weight: (before, after) => before.fillLimitGrams !== null && after.fillLimitGrams === null ? before.fillLimitGrams : null },
  { name: 'overfilled', weight: (before, after) => !has(before, 'overfill') && has(after, 'overfill') ? difference(after.netGrams, after.fillLimitGrams) ?? 0 : null },
  { name: 'noLongerOverfilled', weight: (before, after) => has(before, 'overfill') && !has(after, 'overfill') ? 0 : null },
  { name: 'overdue', weight: (before, after) => !has(before, 'retest-overdue') && has(after, 'retest-overdue') ? 0 : null },
  { name: 'inDateAgain', weight: (before, after) => has(before, 'retest-overdue') && !has(after, 'retest-overdue') ? 0 : null },
]

class Effect {
  private count = 0
  private first: { weight: number, example: RuleExample }[] = []

  take(before: CylinderRow, after: CylinderRow, weight: number | null): void {
    if (weight === null) return
    this.count++
    this.first = [...this.first, { weight, example: exampleOf(before, after) }].sort((a, b) => b.weight - a.weight).slice(0, EXAMPLES)
  }

  answer(): RuleEffect {
    return { count: this.count, examples: this.first.map(({ example }) => example) }
  }
}

function exampleOf(before: CylinderRow, after: CylinderRow): RuleExample {
  const figures = ({ fillLimitGrams, netGrams, dueMonth }: CylinderRow) => ({ fillLimitGrams, netGrams, dueMonth })
  return {
    id: before.id, labelCode: before.labelCode, serial: before.serial, refrigerant: before.refrigerant,
    before: figures(before), after: figures(after),
  }
}

function standingsOf(row: CylinderRow): Standing[] {
  return [ofTest(row), ...(has(row, 'not-seen') ? ['notSeen' as const] : [])]
}

function ofTest(row: CylinderRow): Standing {
  if (has(row, 'retest-unknown')) return 'unknown'
  if (row.dueMonth === null) return 'notRequired'
  if (has(row, 'retest-overdue')) return 'overdue'
  return has(row, 'retest-soon') ? 'soon' : 'inDate'
}

function has(row: CylinderRow, code: CylinderRow['findingCodes'][number]): boolean {
  return row.findingCodes.includes(code)
}

function difference(more: number | null, less: number | null): number | null {
  return more === null || less === null ? null : more - less
}

function positive(grams: number | null): number | null {
  return grams !== null && grams > 0 ? grams : null
}

function none() {
  return { before: 0, after: 0 }
}
