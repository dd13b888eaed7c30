import { describe, expect, it } from 'vitest'
import type { ChoiceParagraph, OwnerChoice } from '~~/utils/requalification/ownerChoice'
import { testPeriod, type Beginning, type Service, type Steel } from '~~/utils/requalification/testPeriod'

const CLEAN: Service = { isOwn: true, dedicatedTo: null, holds: ['R-410A'], hasHeldBurnt: false }
const AMMONIA: Service = { isOwn: true, dedicatedTo: 'R-717', holds: ['R-717'], hasHeldBurnt: false }

function chosen(paragraph: ChoiceParagraph, from: string | null = null): OwnerChoice {
  return { paragraph, reason: 'its service is known', from }
}

function months(beginning: Beginning, spec: string, choices: OwnerChoice[] = [], more: { month?: string, own?: number, steel?: Partial<Steel> } = {}) {
  const steel = { spec, madeMonth: '2010-05', waterCapacityGrams: 22_000, service: CLEAN, ...more.steel }
  return testPeriod(beginning, more.month ?? '2022-05', steel, { intervalMonths: more.own ?? null, ownerChoices: choices })?.months ?? null
}

describe('the period without a choice', () => {
  it('begins with the making and with a volumetric test, starred or not', () => {
    expect(months('made', 'DOT-4BA')).toBe(60)
    expect(months('volumetric', 'DOT-4BA')).toBe(60)
    expect(months('starred', 'DOT-3AA')).toBe(60)
    expect(months('examination', 'DOT-3T')).toBe(60)
  })

  it('begins with no proof pressure test and no outside look', () => {
    expect(months('proof', 'DOT-4BA')).toBeNull()
    expect(months('visual', 'DOT-4BA')).toBeNull()
    expect(months('proof', 'DOT-8')).toBe(120)
  })

  it('is shortened by the owner\'s own months, and never lengthened', () => {
    expect(months('volumetric', 'DOT-4BA', [], { own: 59 })).toBe(59)
    expect(months('volumetric', 'DOT-4BA', [], { own: 61 })).toBe(60)
    expect(months('volumetric', 'DOT-4BA', [], { own: 0 })).toBe(60)
    expect(months('volumetric', 'DOT-4BA', [chosen('180.209(e)')], { own: 120 })).toBe(120)
    expect(months('volumetric', 'DOT-SP', [], { own: 84 })).toBe(84)
    expect(months('volumetric', 'DOT-SP')).toBeNull()
  })
})

describe('an owner\'s choice', () => {
  it('counts for the specifications of its paragraph alone', () => {
    const covered = (paragraph: ChoiceParagraph, beginning: Beginning, longer: number, service?: Service) =>
      ['DOT-3A', 'DOT-3AA', 'DOT-3A480X', 'DOT-3AL', 'DOT-4AA480', 'DOT-4B', 'DOT-4BA', 'DOT-4BW', 'DOT-4B240ET', 'DOT-4D', 'DOT-4E']
        .filter(spec => months(beginning, spec, [chosen(paragraph)], service ? { steel: { service } } : {}) === longer)
    expect(covered('180.209(b)', 'starred', 120)).toEqual(['DOT-3A', 'DOT-3AA'])
    expect(covered('180.209(e)', 'volumetric', 144)).toEqual(['DOT-4B', 'DOT-4BA', 'DOT-4BW', 'DOT-4E'])
    expect(covered('180.209(g)', 'visual', 60)).toEqual(['DOT-3A', 'DOT-3AA', 'DOT-3A480X', 'DOT-4B', 'DOT-4BA', 'DOT-4BW', 'DOT-4E'])
    expect(covered('180.209(h)', 'volumetric', 120, AMMONIA)).toEqual(['DOT-3A', 'DOT-3A480X', 'DOT-4AA480'])
  })

  it('of the star asks for the star, for steel of 1946 or later, and for 125 lb of water at most', () => {
    const star = [chosen('180.209(b)')]
    expect(months('volumetric', 'DOT-3AA', star)).toBe(60)
    expect(months('made', 'DOT-3AA', star)).toBe(60)
    expect(months('starred', 'DOT-3AA', star, { steel: { madeMonth: '1946-01' } })).toBe(120)
    expect(months('starred', 'DOT-3AA', star, { steel: { madeMonth: '1945-12' } })).toBe(60)
    expect(months('starred', 'DOT-3AA', star, { steel: { madeMonth: null } })).toBe(60)
    // 125 lb is 56,699.05 g.
    expect(months('starred', 'DOT-3AA', star, { steel: { waterCapacityGrams: 56_699 } })).toBe(120)
    expect(months('starred', 'DOT-3AA', star, { steel: { waterCapacityGrams: 56_700 } })).toBe(60)
    expect(months('starred', 'DOT-3AA', star, { steel: { waterCapacityGrams: null } })).toBe(60)
  })

  it('of ammonia asks that the cylinder be dedicated to it and hold nothing else', () => {
    const ammonia = [chosen('180.209(h)')]
    expect(months('volumetric', 'DOT-4AA480', ammonia, { steel: { service: AMMONIA } })).toBe(120)
    expect(months('volumetric', 'DOT-4AA480', ammonia, { steel: { service: { ...AMMONIA, holds: [] } } })).toBe(120)
    expect(months('volumetric', 'DOT-4AA480', ammonia, { steel: { service: { ...AMMONIA, dedicatedTo: null } } })).toBe(60)
    expect(months('volumetric', 'DOT-4AA480', ammonia, { steel: { service: { ...AMMONIA, holds: ['R-717', 'R-22'] } } })).toBe(60)
  })

  it.each<[ChoiceParagraph, Beginning, string]>([['180.209(b)', 'starred', 'DOT-3AA'], ['180.209(e)', 'volumetric', 'DOT-4BA']])(
    'of %s covers no ammonia and nothing that burnt refrigerant was in', (paragraph, beginning, spec) => {
      expect(months(beginning, spec, [chosen(paragraph)])).toBeGreaterThan(60)
      expect(months(beginning, spec, [chosen(paragraph)], { steel: { service: AMMONIA } })).toBe(60)
      expect(months(beginning, spec, [chosen(paragraph)], { steel: { service: { ...CLEAN, hasHeldBurnt: true } } })).toBe(60)
    })

  it('covers no cylinder of another owner, whose service nobody here knows', () => {
    const others = { steel: { service: { ...CLEAN, isOwn: false } } }
    expect(months('volumetric', 'DOT-4BA', [chosen('180.209(e)')], others)).toBe(60)
    expect(months('made', 'DOT-4BA', [chosen('180.209(e)')], others)).toBe(60)
    expect(months('visual', 'DOT-4BA', [chosen('180.209(g)')], others)).toBeNull()
    expect(months('starred', 'DOT-3AA', [chosen('180.209(b)')], others)).toBe(60)
    expect(months('volumetric', 'DOT-4AA480', [chosen('180.209(h)')], { steel: { service: { ...AMMONIA, isOwn: false } } })).toBe(60)
    expect(months('volumetric', 'DOT-4BA', [], { own: 36, ...others })).toBe(36)
  })

  it('lets no outside look count once burnt refrigerant was in it', () => {
    expect(months('visual', 'DOT-4BA', [chosen('180.209(g)')])).toBe(60)
    expect(months('visual', 'DOT-4BA', [chosen('180.209(g)')], { steel: { service: { ...CLEAN, hasHeldBurnt: true } } })).toBeNull()
  })

  it('counts for periods that begin in its month or later', () => {
    const later = [chosen('180.209(e)', '2022-05')]
    expect(months('volumetric', 'DOT-4BA', later, { month: '2022-05' })).toBe(144)
    expect(months('volumetric', 'DOT-4BA', later, { month: '2022-04' })).toBe(60)
  })
})
