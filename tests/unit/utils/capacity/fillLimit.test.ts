import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { FillLimitInput } from '~~/utils/capacity/fillLimit'
import { fillLimit } from '~~/utils/capacity/fillLimit'
import { workingText } from '~~/utils/capacity/rules/sumText'
import type { FillLimit, FillRule } from '~~/utils/capacity/types'
import { DEFAULT_FILL_POLICY } from '~~/utils/capacity/types'
import type { MassReading } from '~~/utils/quantity/mass'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { lb, stampOf } from '~~/tests/helpers/stamps'

const GRAMS_PER_POUND = 453.59237

function limitOf(changes: Partial<FillLimitInput> = {}): FillLimit {
  return fillLimit({
    stamp: stampOf(), refrigerant: 'R-410A', condition: 'clean', burnt: false,
    policy: DEFAULT_FILL_POLICY, catalogue: CATALOGUE, ...changes,
  })
}

function term(limit: FillLimit, rule: FillRule) {
  const found = limit.terms.find(one => one.rule === rule)
  if (!found) throw new Error(`${rule} is not among the terms`)
  return found
}

/** The sum of a rule in words, for the usual cylinder of 47.6 lb. */
function sumOf(limit: FillLimit, rule: FillRule, waterCapacity: MassReading = lb(47.6)): string {
  return workingText(term(limit, rule), waterCapacity).replaceAll('\u00A0', ' ')
}

function pounds(limit: FillLimit): number {
  return (limit.exactLimitGrams ?? Number.NaN) / GRAMS_PER_POUND
}

describe('the fill limit', () => {
  it('is 80 % of the water capacity where the refrigerant is heavier than water', () => {
    const limit = limitOf({ refrigerant: 'R-22' })
    expect(limit.governingRule).toBe('water-weight')
    expect(pounds(limit)).toBeCloseTo(38.08, 9)
    // 38.08 x 453.59237 = 17272.797
    expect(limit.fillLimitGrams).toBe(17_272)
  })

  it('is 95 % of liquid-full at 131 F for R-32, whose liquid is lighter than water when hot', () => {
    const limit = limitOf({ refrigerant: 'R-32' })
    expect(limit.governingRule).toBe('hot-ceiling')
    // V = 21.590997 / 0.99904 = 21.61174 L; x 0.8083 kg/L x 0.95 = 16.59535 kg
    expect(limit.fillLimitGrams).toBe(16_595)
  })

  it('is 80 % of the volume as liquid at 77 F for propane', () => {
    const limit = limitOf({ refrigerant: 'R-290' })
    expect(limit.governingRule).toBe('liquid-77F')
    // 21.61174 L x 0.4924 kg/L x 0.8 = 8.51330 kg
    expect(limit.fillLimitGrams).toBe(8513)
  })

  it('shows every rule with its sum and its source', () => {
    const limit = limitOf({ refrigerant: 'R-22' })
    expect(limit.terms.map(one => one.rule)).toEqual([
      'water-weight', 'liquid-77F', 'filling-density', 'hot-ceiling', 'hot-pressure', 'liquid-130F', 'un-ratio', 'oily',
    ])
    expect(sumOf(limit, 'water-weight')).toBe('0.80 × WC 47.6 lb = 38.08 lb')
    expect(sumOf(limit, 'hot-ceiling')).toBe('0.95 × 21.61 L × 1.0572 kg/L (liquid R-22 at 131 °F) = 47.85 lb')
    for (const one of limit.terms) expect(one.source, one.rule).not.toBe('')
  })

  it('answers in kilograms to a metric stamp', () => {
    const waterCapacity: MassReading = { unit: 'kg', value: 21.6 }
    const limit = limitOf({ refrigerant: 'R-22', stamp: stampOf({ waterCapacity }) })
    expect(limit.exactLimitGrams).toBeCloseTo(17_280, 6)
    expect(sumOf(limit, 'water-weight', waterCapacity)).toBe('0.80 × WC 21.60 kg = 17.28 kg')
  })

  it('takes the printed filling density as a comparison above our margin', () => {
    // 105 % of 47.6 lb is 49.98 lb; liquid-full at 131 F is 21.61174 L x 1.0572 = 22.848 kg or 50.37 lb; 95 % of that 47.85 lb.
    const density = term(limitOf({ refrigerant: 'R-22' }), 'filling-density')
    expect(density).toMatchObject({ standing: 'above-margin', limitGrams: 22_670 })
    expect(density.because).toContain('above our margin')
    expect(density.source).toContain('173.304a(a)(2)')
  })

  it('hides the figure of a rule that would leave the cylinder liquid-full below 131 F', () => {
    const limit = limitOf({ refrigerant: 'R-143a' })
    const water = term(limit, 'water-weight')
    expect(water).toMatchObject({ standing: 'unsafe', limitGrams: null })
    expect(water.because).toContain('unsafe for R-143a')
    expect(sumOf(limit, 'water-weight')).toBe('0.80 × WC 47.6 lb')
  })

  it('lets a rule without data say why, and never govern', () => {
    const density = term(limitOf({ refrigerant: 'R-410A' }), 'filling-density')
    expect(density.limitGrams).toBeNull()
    expect(density.because).toContain('does not name R-410A')
  })
})

describe('the default rules together, over every refrigerant of the catalogue', () => {
  const liquids = [...CATALOGUE.refrigerants.values()].filter(fluid => fluid.tableMaxC >= 55)

  it.each(liquids.map(fluid => fluid.designation))('leave room for the liquid of %s at 131 F', (designation) => {
    const row = CATALOGUE.refrigerants.get(designation)?.table.find(one => one.tC === 55)
    const liquidFullGrams = 47.6 * GRAMS_PER_POUND / 0.99904 * (row?.liquidDensity ?? Number.NaN) / 1000
    const limit = limitOf({ refrigerant: designation })
    expect(limit.exactLimitGrams).not.toBeNull()
    expect(limit.exactLimitGrams).toBeLessThanOrEqual(liquidFullGrams * 0.95 + 1e-6)
  })

  function unsafeUnder(rule: FillRule): string[] {
    return liquids.map(fluid => fluid.designation)
      .filter(designation => term(limitOf({ refrigerant: designation }), rule).standing === 'unsafe').sort()
  }

  it('are needed: the water weight alone overfills six of them', () => {
    expect(unsafeUnder('water-weight')).toEqual(['R-1270', 'R-143a', 'R-290', 'R-600', 'R-600a', 'R-717'])
  })

  it('are needed: the liquid at 77 F alone overfills R-125', () => {
    expect(unsafeUnder('liquid-77F')).toEqual(['R-125'])
  })

  it('never give more for a smaller cylinder', () => {
    const capacity = fc.integer({ min: 1, max: 20_000 }).map(tenths => tenths / 10)
    fc.assert(fc.property(capacity, capacity, fc.constantFrom(...liquids.map(fluid => fluid.designation)), (a, b, refrigerant) => {
      const [small, large] = [Math.min(a, b), Math.max(a, b)].map(value =>
        limitOf({ refrigerant, stamp: stampOf({ waterCapacity: lb(value) }) }).fillLimitGrams ?? Number.NaN)
      expect(small).toBeLessThanOrEqual(large ?? Number.NaN)
    }), { numRuns: 50 })
  })
})

describe('the firm\'s rule', () => {
  it('lowers the limit with a lower share', () => {
    const limit = limitOf({ refrigerant: 'R-22', policy: { ...DEFAULT_FILL_POLICY, shareThousandths: 700 } })
    expect(pounds(limit)).toBeCloseTo(33.32, 9)
    expect(sumOf(limit, 'water-weight')).toContain('0.70 ×')
  })

  it('lowers the ceiling', () => {
    const limit = limitOf({ refrigerant: 'R-32', policy: { ...DEFAULT_FILL_POLICY, ceilingThousandths: 900 } })
    // 21.61174 L x 0.8083 kg/L x 0.90 = 15.72191 kg
    expect(limit.fillLimitGrams).toBe(15_721)
  })

  it('cannot raise either', () => {
    const raised = { ...DEFAULT_FILL_POLICY, shareThousandths: 1000, ceilingThousandths: 1000 }
    expect(limitOf({ refrigerant: 'R-22', policy: raised }).fillLimitGrams).toBe(17_272)
    expect(limitOf({ refrigerant: 'R-32', policy: raised }).fillLimitGrams).toBe(16_595)
  })

  it('shows the rules it has not chosen beside the others, and lets the chosen ones govern', () => {
    expect(term(limitOf(), 'liquid-130F').standing).toBe('compared')
    expect(limitOf().governingRule).toBe('water-weight')
    const hotVan = limitOf({ policy: { ...DEFAULT_FILL_POLICY, options: { liquid130F: true, unRatio: false } } })
    expect(hotVan.governingRule).toBe('liquid-130F')
    expect(pounds(hotVan)).toBeLessThan(38.08)
  })

  it('takes the published filling ratio of 0.87 kg/L for R-125', () => {
    // 21.61174 L x 0.87 kg/L = 18.80221 kg
    expect(term(limitOf({ refrigerant: 'R-125' }), 'un-ratio').limitGrams).toBe(18_802)
  })

  it('gives no figure for R-428A under the filling ratio, which has none for it', () => {
    expect(limitOf({ refrigerant: 'R-428A' }).governingRule).toBe('water-weight')
    const metric = limitOf({ refrigerant: 'R-428A', policy: { ...DEFAULT_FILL_POLICY, options: { liquid130F: false, unRatio: true } } })
    expect(metric).toMatchObject({ governingRule: null, exactLimitGrams: null, fillLimitGrams: null })
    expect(term(metric, 'un-ratio').because).toContain('60 °C')
  })
})

describe('burnt refrigerant', () => {
  it('is held to 69 % of the volume as liquid at 50 C, whatever the share', () => {
    // 21.61174 L x 0.9068 kg/L x 0.69 = 13.52229 kg
    const burnt = limitOf({ condition: 'burnt', burnt: true })
    expect(burnt).toMatchObject({ governingRule: 'oily', fillLimitGrams: 13_522 })
    const stricter = limitOf({ burnt: true, policy: { ...DEFAULT_FILL_POLICY, shareThousandths: 750 } })
    expect(term(stricter, 'oily').limitGrams).toBe(13_522)
  })

  it('stays burnt whatever the word for its condition is now', () => {
    expect(limitOf({ condition: 'suspect', burnt: true }).governingRule).toBe('oily')
    expect(term(limitOf({ condition: 'suspect' }), 'oily').standing).toBe('compared')
    expect(limitOf({ condition: 'suspect' }).governingRule).toBe('water-weight')
  })

  it('is 0.75 kg/L for burnt R-12, which is published and lower than the share carried over from R-22', () => {
    const limit = limitOf({ refrigerant: 'R-12', condition: 'burnt' })
    // V = 21.590997 / 0.99904 = 21.611744 L; x 0.75 kg/L = 16.208808 kg, against 0.69 x 1.213 kg/L = 0.837 kg/L
    expect(limit).toMatchObject({ governingRule: 'oily', fillLimitGrams: 16_208 })
    expect(sumOf(limit, 'oily')).toBe('21.61 L × 0.7500 kg/L (printed for R-12 with oil) = 35.73 lb')
    expect(term(limit, 'oily').source).toContain('TRG 102')
  })

  it('holds R-22 to its own share with oil, which comes just below the published 0.75 kg/L', () => {
    // 21.611744 L x 0.75 kg/L = 16.208808 kg
    expect(limitOf({ condition: 'burnt', refrigerant: 'R-22' }).fillLimitGrams).toBeLessThan(16_208)
  })
})

describe('what is not known', () => {
  it('is named, and there is no figure without a tare', () => {
    const limit = limitOf({ stamp: stampOf({ tareWeight: null }) })
    expect(limit).toMatchObject({ fillLimitGrams: null, governingRule: null, missing: ['tareWeight'] })
  })

  it('includes a tare stamped without the valve, until one is weighed', () => {
    const stamp = stampOf({ tareIncludesValve: false })
    expect(limitOf({ stamp }).missing).toEqual(['tareWeight'])
    expect(limitOf({ stamp, tareGrams: 12_600 })).toMatchObject({ missing: [], governingRule: 'water-weight' })
  })

  it('is the water capacity: no figure and no sum', () => {
    const limit = limitOf({ stamp: stampOf({ waterCapacity: null }) })
    expect(limit).toMatchObject({ governingRule: null, exactLimitGrams: null, fillLimitGrams: null, missing: ['waterCapacity'] })
    expect(limit.terms).toHaveLength(8)
    for (const one of limit.terms) expect(one).toMatchObject({ limitGrams: null, because: 'the water capacity is not known', factors: [] })
  })

  it('is the service pressure: it is named, and the limit of what is in it still stands', () => {
    const limit = limitOf({ stamp: stampOf({ servicePressurePsig: null }) })
    expect(limit.missing).toEqual(['servicePressure'])
    expect(limit.governingRule).toBe('water-weight')
  })

  it.each<[string, Partial<FillLimitInput>]>([
    ['no refrigerant named', { refrigerant: null }],
    ['mixed contents', { condition: 'mixed' }],
    ['unknown contents', { condition: 'unknown' }],
    ['a refrigerant outside the catalogue', { refrigerant: 'R-13B1' }],
  ])('is what is in it: %s', (_words, changes) => {
    expect(limitOf(changes)).toMatchObject({ fillLimitGrams: null, governingRule: null, missing: ['refrigerant'] })
  })
})

describe('the factors of a rule', () => {
  it('are what its sum multiplies, each with its unit, its temperature and its source', () => {
    const { factors } = term(limitOf({ refrigerant: 'R-22' }), 'hot-ceiling')
    expect(factors).toEqual([
      { name: 'share', value: 0.95, unit: '' },
      // 47.6 x 0.45359237 = 21.590997 kg; / 0.99904 = 21.611744 L.
      { name: 'volume', value: expect.closeTo(21.611744, 6), unit: 'L', note: 'WC ÷ 0.99904 kg/L' },
      {
        name: 'liquid-density', value: expect.closeTo(1.0572, 9), unit: 'kg/L', atC: 55, note: 'liquid R-22',
        source: expect.stringContaining('CoolProp'), relativeError: 0.003,
      },
    ])
  })

  it('carry how far a density may be off, and what makes it doubtful', () => {
    const density = (refrigerant: string) => term(limitOf({ refrigerant }), 'liquid-77F').factors[2]
    expect(density('R-402A')).toMatchObject({ name: 'liquid-density', relativeError: 0.034, doubt: CATALOGUE.refrigerants.get('R-402A')?.doubt })
    expect(density('R-402A')?.doubt).toMatch(/\w/)
    expect(density('R-410B')).toMatchObject({ relativeError: 0.05 })
    expect(density('R-22')).not.toHaveProperty('doubt')
    const ratio = (refrigerant: string) => term(limitOf({ refrigerant }), 'un-ratio').factors[1]
    expect(ratio('R-22')).toMatchObject({ name: 'filling-ratio', relativeError: 0.003 })
    expect(ratio('R-125')).toEqual({ name: 'filling-ratio', value: 0.87, unit: 'kg/L', note: 'printed for R-125', source: expect.stringContaining('T50') })
  })

  it('are a percent and the water capacity for a filling density, as in the regulation', () => {
    const limit = limitOf({ refrigerant: 'R-22' })
    expect(term(limit, 'filling-density').factors).toEqual([
      { name: 'filling-density', value: 105, unit: '%', note: 'filling density of R-22', source: '49 CFR 173.304a(a)(2)' },
      { name: 'water-capacity', value: 47.6, unit: 'lb' },
    ])
    expect(sumOf(limit, 'filling-density')).toBe('105 % (filling density of R-22) × WC 47.6 lb = 49.98 lb')
  })

  it('name the specific gravity of a hydrocarbon', () => {
    const limit = limitOf({ refrigerant: 'R-290' })
    expect(term(limit, 'filling-density').factors[0]).toMatchObject({ value: 42, unit: '%', note: expect.stringMatching(/^specific gravity 0\.50\d at 60 °F$/) })
  })

  it('are the volume and the density at the pressure for a gas when hot', () => {
    const limit = limitOf({ refrigerant: 'R-23' })
    expect(term(limit, 'hot-pressure').factors.map(factor => factor.name)).toEqual(['volume', 'density-at-pressure'])
    expect(sumOf(limit, 'hot-pressure')).toMatch(/^21\.61 L × 0\.11\d\d kg\/L \(400 psig at 70 °F\) = 5\.\d\d lb$/)
  })

  it('show pounds and ounces as they are stamped', () => {
    const waterCapacity: MassReading = { unit: 'lb-oz', lb: 47, oz: 8 }
    const limit = limitOf({ refrigerant: 'R-22', stamp: stampOf({ waterCapacity }) })
    expect(term(limit, 'water-weight').factors[1]).toEqual({ name: 'water-capacity', value: 47.5, unit: 'lb', note: '47\u00A0lb\u00A08\u00A0oz' })
    expect(sumOf(limit, 'water-weight', waterCapacity)).toBe('0.80 × WC 47 lb 8 oz = 38.00 lb')
  })

  it.each(['R-22', 'R-32', 'R-290', 'R-125', 'R-23', 'R-744', 'R-410B'])('make together the limit of every rule that has one: %s', (refrigerant) => {
    const stamp = stampOf({ spec: 'DOT-3AA', servicePressurePsig: 1800 })
    const figures = limitOf({ refrigerant, stamp }).terms.filter(one => one.limitGrams !== null)
    expect(figures.length).toBeGreaterThan(0)
    for (const { rule, factors, limitGrams } of figures) {
      const product = factors.reduce((sum, { value, unit }) => sum * (unit === '%' ? value / 100 : unit === 'lb' ? value * GRAMS_PER_POUND : value), 1)
      const grams = factors.some(({ unit }) => unit === 'lb') ? product : product * 1000
      expect(Math.floor(grams + 1e-6), rule).toBe(limitGrams)
    }
  })
})

describe('a blend that is known by its composition alone', () => {
  it('is held by the density of its parts less 5 %: R-410B', () => {
    // At 131 F: 1 / (0.45/808.3 + 0.55/945.4) = 878.357 kg/m3; x 0.95 x 0.95 x 21.611744 L = 17,131.9 g; 80 % of the water 17,272 g.
    const limit = limitOf({ refrigerant: 'R-410B' })
    expect(limit).toMatchObject({ governingRule: 'hot-ceiling', missing: [] })
    expect(limit.exactLimitGrams).toBeCloseTo(17_131.9, 0)
    expect(sumOf(limit, 'hot-ceiling')).toBe('0.95 × 21.61 L × 0.8784 kg/L (liquid R-410B at 131 °F) × 0.95 (for ideal mixing) = 37.76 lb')
  })

  it('has no figure by a rule for which its parts have none', () => {
    const limit = limitOf({ refrigerant: 'R-410B' })
    expect(term(limit, 'un-ratio')).toMatchObject({ limitGrams: null, because: 'R-410B has no liquid at 60 °C, or no figure for it' })
    expect(term(limit, 'filling-density').because).toBe('the table does not name R-410B')
  })

  it('has none at all where it cannot be reckoned, and says why', () => {
    const blend = { designation: 'R-0', components: [{ component: 'R-744', massPercent: 10 }, { component: 'R-32', massPercent: 90 }], source: '' }
    const limit = limitOf({ refrigerant: 'R-0', catalogue: { ...CATALOGUE, compositions: new Map([['R-0', blend]]) } })
    expect(limit).toMatchObject({ governingRule: null, fillLimitGrams: null, missing: ['refrigerant'] })
    for (const one of limit.terms) expect(one.because).toContain('R-744 is near or above its critical temperature')
  })
})

describe('a fluid that is a gas at 131 F', () => {
  it('is held by pressure: R-23 at 400 psig', () => {
    // At 131 F 1.25 x 400 psig = 3548.7 kPa absolute would allow 116 to 118 kg/m3; at 70 F 400 psig = 2859.2 kPa lies between
    // 2621.8 at 100 and 3388.1 at 150 kg/m3, on a curve that bends down: 113 to 115.5 kg/m3, the lower one.
    const limit = limitOf({ refrigerant: 'R-23' })
    expect(limit.governingRule).toBe('hot-pressure')
    const kgPerM3 = (limit.exactLimitGrams ?? 0) / 21.61174
    expect(kgPerM3).toBeGreaterThan(113)
    expect(kgPerM3).toBeLessThan(115.5)
    expect(term(limit, 'hot-pressure').source).toContain('173.301a(c)')
    expect(term(limit, 'water-weight')).toMatchObject({ standing: 'unsafe', limitGrams: null })
  })

  it('has no limit in a cylinder whose pressure does not suit it, nor in one without a mark', () => {
    expect(limitOf({ refrigerant: 'R-23', stamp: stampOf({ servicePressurePsig: 260 }) }).fillLimitGrams).toBeNull()
    expect(limitOf({ refrigerant: 'R-23', stamp: stampOf({ servicePressurePsig: null }) }).fillLimitGrams).toBeNull()
  })

  it('takes the lowest of its row, the water weight and the pressure: R-13 in a 3AA1800', () => {
    // Row: 100 %; water weight: 80 %, that is 799.2 kg/m3, at which the pressure is 8 MPa, under 5/4 of 1800 psig.
    const limit = limitOf({ refrigerant: 'R-13', stamp: stampOf({ spec: 'DOT-3AA', servicePressurePsig: 1800 }) })
    expect(limit.governingRule).toBe('water-weight')
    expect(pounds(limit)).toBeCloseTo(38.08, 9)
  })

  it.each([
    [1800, 68], [1999, 68], [2000, 70.3], [2265, 73.2], [2400, 74.5],
  ])('lets the best row of R-744 decide alone: 3AA at %d psig holds %d %%', (servicePressurePsig, percent) => {
    const limit = limitOf({ refrigerant: 'R-744', stamp: stampOf({ spec: 'DOT-3AA', servicePressurePsig }) })
    expect(limit.governingRule).toBe('filling-density')
    expect(limit.exactLimitGrams).toBeCloseTo(47.6 * GRAMS_PER_POUND * percent / 100, 6)
    const others = limit.terms.filter(one => one.rule !== 'filling-density')
    expect(others).toHaveLength(7)
    for (const one of others) expect(one).toMatchObject({ limitGrams: null, because: expect.stringContaining('its row of filling densities alone decides') })
  })

  it('has no limit for R-744 where no row is met', () => {
    for (const stamp of [stampOf(), stampOf({ spec: 'DOT-3AA', servicePressurePsig: 1799 })]) {
      expect(limitOf({ refrigerant: 'R-744', stamp }).fillLimitGrams).toBeNull()
    }
  })
})
