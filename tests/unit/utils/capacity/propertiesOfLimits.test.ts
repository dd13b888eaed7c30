import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { FillLimitInput } from '~~/utils/capacity/fillLimit'
import { fillLimit } from '~~/utils/capacity/fillLimit'
import { liquidFullTemperature } from '~~/utils/capacity/liquidFull'
import type { RuleInput } from '~~/utils/capacity/rules/ruleInput'
import { workingText } from '~~/utils/capacity/rules/sumText'
import { ruleAnswers } from '~~/utils/capacity/rulesInForce'
import { twoPhase } from '~~/utils/capacity/twoPhase'
import type { Factor, FillLimit, FillRule } from '~~/utils/capacity/types'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import { exactGrams } from '~~/utils/quantity/mass'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import type { Refrigerant } from '~~/utils/refrigerant/types'
import {
  anyCondition, anyPartialStamp, anyPolicy, anyStamp, anyWaterCapacity, GAS_WHEN_HOT, LIQUID_WHEN_HOT,
} from '~~/tests/helpers/capacityArbitraries'
import { stampOf } from '~~/tests/helpers/stamps'

const EVERY_RULE: FillRule[] = ['water-weight', 'liquid-77F', 'filling-density', 'hot-ceiling', 'liquid-130F', 'un-ratio', 'oily', 'hot-pressure']

const HOT_C = 55
const KG_PER_LITRE_OF_WATER = 0.99904

function litres(input: Pick<RuleInput, 'waterCapacity'>): number {
  return exactGrams(input.waterCapacity) / 1000 / KG_PER_LITRE_OF_WATER
}

function rowAt(refrigerant: Refrigerant, tC: number) {
  return refrigerant.table.find(row => row.tC === tC)!
}

/** The refrigerants that a rule, used alone, leaves liquid-full at or below 131 F, by designation. */
function overfilledBy(rule: FillRule, waterCapacity: RuleInput['waterCapacity']): string[] {
  return LIQUID_WHEN_HOT.filter((refrigerant) => {
    const input: RuleInput = {
      waterCapacity, waterCapacityGrams: exactGrams(waterCapacity), volumeLitres: litres({ waterCapacity }),
      cylinder: stampOf({ spec: 'DOT-3AA', servicePressurePsig: 2400 }), fluid: refrigerant, supercritical: null, policy: DEFAULT_FILL_POLICY,
    }
    const netGrams = ruleAnswers(input, true).find(answer => answer.rule === rule)?.figure.exactGrams ?? 0
    const isFull = twoPhase({ netGrams, volumeLitres: litres({ waterCapacity }), refrigerant, tC: HOT_C }).phase === 'liquid-full'
    // Three ways to the same: the two-phase balance, the weight of a full volume by the table's own row, the temperature.
    expect(isFull, refrigerant.designation).toBe(netGrams >= litres({ waterCapacity }) * rowAt(refrigerant, HOT_C).liquidDensity)
    const full = liquidFullTemperature({ netGrams, waterCapacityGrams: exactGrams(waterCapacity), refrigerant })
    expect(isFull, refrigerant.designation).toBe(full !== null && 'c' in full && full.c <= HOT_C)
    return isFull
  }).map(({ designation }) => designation)
}

describe('a rule used alone', () => {
  it.each<[FillRule, string[]]>([
    ['water-weight', ['R-143a', 'R-290', 'R-600', 'R-600a', 'R-1270', 'R-717']],
    ['liquid-77F', ['R-125']],
    ['filling-density', []],
    ['hot-ceiling', []],
    ['liquid-130F', []],
    ['un-ratio', []],
    ['oily', []],
  ])('%s overfills by 131 F, in any cylinder, exactly %j', (rule, offenders) => {
    fc.assert(fc.property(anyWaterCapacity, (waterCapacity) => {
      expect(overfilledBy(rule, waterCapacity)).toEqual(offenders)
    }), { numRuns: 20 })
  })

  it('is looked at for the 74 refrigerants that are liquids at 131 F', () => {
    expect(LIQUID_WHEN_HOT).toHaveLength(74)
    expect(GAS_WHEN_HOT.map(({ designation }) => designation)).toEqual(['R-13', 'R-23', 'R-744', 'R-503', 'R-508B'])
  })
})

// The catalogue is left out of what is made up, so that a counterexample can be read.
type Question = Omit<FillLimitInput, 'catalogue'>

const anyInput: fc.Arbitrary<Question> = fc.record({
  stamp: anyStamp,
  refrigerant: fc.constantFrom(...CATALOGUE.refrigerants.keys()),
  condition: fc.constantFrom('clean', 'suspect', 'burnt'),
  burnt: fc.boolean(),
  policy: anyPolicy,
})

/** Also with what is not known, not readable or only known by its composition. */
const anyQuestion: fc.Arbitrary<Question> = fc.record({
  stamp: fc.oneof(anyStamp, anyPartialStamp),
  refrigerant: fc.constantFrom(...CATALOGUE.refrigerants.keys(), ...CATALOGUE.compositions.keys(), 'R-9999', null),
  condition: anyCondition,
  burnt: fc.boolean(),
  policy: anyPolicy,
})

function answerTo(question: Question): FillLimit {
  return fillLimit({ ...question, catalogue: CATALOGUE })
}

/** The limit in grams to a litre, which is kg/m3, or null. */
function fillDensity(input: Question): number | null {
  const { exactLimitGrams } = answerTo(input)
  return exactLimitGrams === null ? null : exactLimitGrams / litres({ waterCapacity: input.stamp.waterCapacity! })
}

describe('the default set of rules', () => {
  it.each(LIQUID_WHEN_HOT.map(({ designation }) => designation))('leaves %s a vapour at 131 F, by any stamp, rule of the firm and condition', (designation) => {
    const { liquidDensity } = rowAt(CATALOGUE.refrigerants.get(designation)!, HOT_C)
    fc.assert(fc.property(anyInput, (input) => {
      const density = fillDensity({ ...input, refrigerant: designation })
      if (density !== null) expect(density).toBeLessThanOrEqual(liquidDensity * Math.min(0.95, input.policy.ceilingThousandths / 1000) * (1 + 1e-12))
    }), { numRuns: 20 })
  })

  it('holds a gas under 5/4 of the service pressure at 131 F and under it at 70 F', () => {
    fc.assert(fc.property(anyInput, fc.constantFrom('R-13', 'R-23', 'R-503', 'R-508B'), (input, designation) => {
      const density = fillDensity({ ...input, refrigerant: designation })
      if (density === null) return
      const { tempsC, rows } = CATALOGUE.supercritical.get(designation)!
      const psig = input.stamp.servicePressurePsig!
      // The pressure at the next row below cannot be above what is allowed.
      const below = rows.findLast(row => row[0]! <= density)
      if (!below) return
      expect(below[tempsC.indexOf(HOT_C) + 1]).toBeLessThanOrEqual(1.25 * psig * 6.894757293168361 + 101.325)
      expect(below[tempsC.indexOf(21.1) + 1]).toBeLessThanOrEqual(psig * 6.894757293168361 + 101.325)
    }), { numRuns: 300 })
  })

  it('gives R-744 nothing but the filling density of a row', () => {
    fc.assert(fc.property(anyInput, (input) => {
      const { exactLimitGrams, governingRule } = answerTo({ ...input, refrigerant: 'R-744' })
      if (exactLimitGrams === null) return
      expect(governingRule).toBe('filling-density')
      const percent = exactLimitGrams / exactGrams(input.stamp.waterCapacity!) * 100
      expect([68, 70.3, 73.2, 74.5].some(printed => Math.abs(printed - percent) < 1e-9)).toBe(true)
    }))
  })
})

describe('every answer', () => {
  it('lists every rule exactly once, with a figure or with why it has none', () => {
    fc.assert(fc.property(anyQuestion, (input) => {
      const { terms } = answerTo(input)
      expect(terms.map(({ rule }) => rule).sort()).toEqual([...EVERY_RULE].sort())
      for (const term of terms) if (term.limitGrams === null) expect(term.because, term.rule).toMatch(/\w/)
    }), { numRuns: 500 })
  })

  it('shows no figure of a rule that is unsafe, nor one that would leave no vapour at 131 F', () => {
    fc.assert(fc.property(anyInput, (input) => {
      const { terms } = answerTo(input)
      for (const term of terms) {
        const { rule, standing, limitGrams } = term
        if (standing === 'unsafe') expect([limitGrams, workingText(term, input.stamp.waterCapacity!).includes('=')], rule).toEqual([null, false])
        const hot = CATALOGUE.refrigerants.get(input.refrigerant!)!.table.find(row => row.tC === HOT_C)
        if (hot && limitGrams !== null) expect(limitGrams, rule).toBeLessThanOrEqual(litres({ waterCapacity: input.stamp.waterCapacity! }) * hot.liquidDensity)
      }
    }), { numRuns: 500 })
  })

  it('calls a rule unsafe above liquid-full at 131 F, above our margin above the ceiling, and else neither', () => {
    fc.assert(fc.property(anyInput, fc.constantFrom(...LIQUID_WHEN_HOT.map(({ designation }) => designation)), (input, refrigerant) => {
      const full = litres({ waterCapacity: input.stamp.waterCapacity! }) * rowAt(CATALOGUE.refrigerants.get(refrigerant)!, HOT_C).liquidDensity
      const ceiling = full * Math.min(0.95, input.policy.ceilingThousandths / 1000)
      for (const { rule, standing, factors } of answerTo({ ...input, refrigerant }).terms) {
        if (factors.length === 0 || rule === 'hot-ceiling') continue
        const grams = gramsOfProduct(factors)
        if (standing === 'unsafe') expect(grams, rule).toBeGreaterThan(full - 1e-6)
        else if (standing === 'above-margin') expect([grams > ceiling - 1e-6, grams < full + 1e-6], rule).toEqual([true, true])
        else expect(grams, rule).toBeLessThan(ceiling + 1e-6)
      }
    }), { numRuns: 500 })
  })

  it('shows as each figure the product of its factors', () => {
    fc.assert(fc.property(anyQuestion, (input) => {
      for (const { rule, limitGrams, factors } of answerTo(input).terms) {
        if (limitGrams !== null) expect(Math.abs(gramsOfProduct(factors) - limitGrams - 0.5), rule).toBeLessThanOrEqual(0.5 + 1e-6)
      }
    }), { numRuns: 500 })
  })

  it('is governed by a rule in force that has the lowest figure of them, rounded down', () => {
    fc.assert(fc.property(anyInput, (input) => {
      const { governingRule, fillLimitGrams, exactLimitGrams, terms } = answerTo(input)
      if (governingRule === null || fillLimitGrams === null || exactLimitGrams === null) {
        expect([governingRule, fillLimitGrams, exactLimitGrams]).toEqual([null, null, null])
        return
      }
      const inForce = terms.filter(({ standing }) => standing === 'in-force').flatMap(({ limitGrams }) => limitGrams ?? [])
      expect(fillLimitGrams).toBe(Math.min(...inForce))
      expect(terms.find(({ rule }) => rule === governingRule)).toMatchObject({ standing: 'in-force', limitGrams: fillLimitGrams })
      expect(fillLimitGrams).toBeLessThanOrEqual(exactLimitGrams)
      expect(exactLimitGrams - fillLimitGrams).toBeLessThan(1)
    }), { numRuns: 500 })
  })

  it('holds no figure that is not finite', () => {
    fc.assert(fc.property(anyQuestion, input => expectFinite(answerTo(input))), { numRuns: 500 })
  })

  it('is the same twice and leaves what it was asked as it was', () => {
    fc.assert(fc.property(anyQuestion, (input) => {
      const before = structuredClone(input)
      expect(answerTo(input)).toEqual(answerTo(input))
      expect(input).toEqual(before)
    }), { numRuns: 50 })
  })
})

/** Pounds, kilograms, litres and kg/L multiplied by hand. */
function gramsOfProduct(factors: readonly Factor[]): number {
  const grams: Record<Factor['unit'], number> = { 'lb': 453.59237, 'kg': 1000, 'L': 1, 'kg/L': 1000, '%': 0.01, '': 1 }
  return factors.reduce((product, { value, unit }) => product * value * grams[unit], 1)
}

function expectFinite(value: unknown): void {
  if (typeof value === 'number') expect(Number.isFinite(value)).toBe(true)
  else if (typeof value === 'string') expect(value).not.toMatch(/NaN|Infinity|undefined/)
  else if (typeof value === 'object' && value !== null) Object.values(value).forEach(expectFinite)
}

describe('the fill limit never falls', () => {
  // A figure that is lost on the way would count as a fall to nothing.
  const limit = (input: Question) => answerTo(input).exactLimitGrams ?? -1

  it('with a larger water capacity', () => {
    fc.assert(fc.property(anyInput, anyWaterCapacity, (input, other) => {
      const capacities = [input.stamp.waterCapacity!, other].sort((a, b) => exactGrams(a) - exactGrams(b))
      const [smaller, larger] = capacities.map(waterCapacity => limit({ ...input, stamp: { ...input.stamp, waterCapacity } }))
      expect(smaller).toBeLessThanOrEqual(larger! + 1e-6)
    }), { numRuns: 500 })
  })

  it('with a larger share', () => {
    fc.assert(fc.property(anyInput, fc.integer({ min: 1, max: 1000 }), (input, other) => {
      const shares = [input.policy.shareThousandths, other].sort((a, b) => a - b)
      const [smaller, larger] = shares.map(shareThousandths => limit({ ...input, policy: { ...input.policy, shareThousandths } }))
      expect(smaller).toBeLessThanOrEqual(larger!)
    }), { numRuns: 500 })
  })

  it('with a higher ceiling', () => {
    fc.assert(fc.property(anyInput, fc.integer({ min: 1, max: 1000 }), (input, other) => {
      const ceilings = [input.policy.ceilingThousandths, other].sort((a, b) => a - b)
      const [lower, higher] = ceilings.map(ceilingThousandths => limit({ ...input, policy: { ...input.policy, ceilingThousandths } }))
      expect(lower).toBeLessThanOrEqual(higher!)
    }), { numRuns: 500 })
  })

  it('beyond 0.80 and 0.95, whatever a firm would set', () => {
    fc.assert(fc.property(anyInput, (input) => {
      const { options } = input.policy
      const beyond = limit({ ...input, policy: { shareThousandths: 1000, ceilingThousandths: 1000, options } })
      expect(beyond).toBe(limit({ ...input, policy: { shareThousandths: 800, ceilingThousandths: 950, options } }))
    }))
  })

  it('when a rule is added, which can only take away', () => {
    fc.assert(fc.property(anyInput, (input) => {
      const none = { ...input, burnt: false, condition: 'clean' as const, policy: { ...input.policy, options: { liquid130F: false, unRatio: false } } }
      const { options } = input.policy
      expect(limit({ ...none, policy: { ...none.policy, options } })).toBeLessThanOrEqual(limit(none))
      expect(limit({ ...none, burnt: true })).toBeLessThanOrEqual(limit(none))
    }), { numRuns: 300 })
  })
})
