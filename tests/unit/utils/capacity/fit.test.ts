import { describe, expect, it } from 'vitest'
import { fitFindings } from '~~/utils/capacity/fit'
import type { Stamp } from '~~/utils/capacity/types'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { stampOf } from '~~/tests/helpers/stamps'

function codes(refrigerant: string | null, changes: Partial<Stamp> = {}): string[] {
  return fitFindings({ stamp: stampOf(changes), refrigerant, catalogue: CATALOGUE }).map(finding => finding.code)
}

describe('the pressure class', () => {
  it.each([
    ['R-410A', 400, []],
    // (3439.1 x 1.01 - 101.325) / 6.894757 = 489.1 psig; 5/4 of 391 psig is 488.75, of 392 psig 490.
    ['R-410A', 391, ['pressure-class']],
    ['R-410A', 392, []],
    // (3519.9 x 1.005 - 101.325) / 6.894757 = 498.4 psig; 5/4 of 398 psig is 497.5, of 399 psig 498.75.
    ['R-32', 398, ['pressure-class']],
    ['R-32', 399, []],
    // Wide-glide blend whose bubble pressure is uncertain by 20 %.
    ['R-470A', 400, ['pressure-class']],
  ])('holds the hot pressure of %s, raised by its error, to 5/4 of %d psig', (refrigerant, servicePressurePsig, expected) => {
    expect(codes(refrigerant, { servicePressurePsig })).toEqual(expected)
  })

  it('asks at least 240 psig for a gas that no row names', () => {
    expect(codes('R-134a', { servicePressurePsig: 240 })).toEqual([])
    expect(codes('R-134a', { servicePressurePsig: 239 })).toEqual(['pressure-class'])
  })

  it('lets the row of a named gas decide, whatever the 5/4 rule says', () => {
    // R-22 reaches 302.4 psig with its error, more than 5/4 of 240 psig; its row asks for 240.
    expect(codes('R-22', { servicePressurePsig: 240 })).toEqual([])
    expect(codes('R-22', { servicePressurePsig: 239 })).toEqual(['pressure-class'])
    // R-134a would be refused below 240 psig, R-12 is allowed from 225.
    expect(codes('R-12', { servicePressurePsig: 225 })).toEqual([])
  })

  it('refuses a gas when hot where no fill density keeps it under 5/4 of the mark', () => {
    expect(codes('R-23', { servicePressurePsig: 400 })).toEqual([])
    expect(codes('R-23', { servicePressurePsig: 260 })).toEqual(['pressure-class'])
  })

  it('is not judged without a mark, which the fill limit names as missing', () => {
    expect(codes('R-410A', { servicePressurePsig: null })).toEqual([])
  })

  it('says the figures it compares', () => {
    const [finding] = fitFindings({ stamp: stampOf({ servicePressurePsig: 350 }), refrigerant: 'R-410A', catalogue: CATALOGUE })
    expect(finding).toMatchObject({
      severity: 'stop',
      text: 'R-410A may reach 490 psig at 131 °F; a service pressure of 350 psig allows 437 psig.',
    })
    expect(finding?.source).toContain('173.301a(d)')
  })
})

describe('the specification', () => {
  it('must be one that the row of a named gas lists', () => {
    expect(codes('R-717', { spec: 'DOT-4BA', servicePressurePsig: 500 })).toEqual(['spec-not-for-gas', 'toxic'])
    expect(codes('R-717', { spec: 'DOT-4AA480', servicePressurePsig: 480 })).toEqual(['toxic'])
    expect(codes('R-717', { spec: 'DOT-3AA', servicePressurePsig: 479 })).toEqual(['pressure-class', 'toxic'])
  })

  it('must be authorised for liquefied gases where no row names the gas', () => {
    expect(codes('R-410A', { spec: 'DOT-4BW' })).toEqual([])
    expect(codes('R-410A', { spec: 'DOT-4DS' })).toEqual(['spec-not-for-gas'])
    expect(codes('R-410A', { spec: 'DOT-SP' })).toEqual(['spec-not-for-gas'])
  })

  it('is never a 4E for a toxic gas', () => {
    expect(codes('R-123', { spec: 'DOT-4E', servicePressurePsig: 240 })).toEqual(['spec-not-for-gas', 'toxic'])
    expect(codes('R-124', { spec: 'DOT-4E', servicePressurePsig: 240 })).toEqual([])
  })

  it('that fixes its pressure is not believed to stand more', () => {
    // R-410A may reach 489.1 psig; a 4B240ET stands 5/4 of 240 psig, 300 psig.
    expect(codes('R-410A', { spec: 'DOT-4B240ET', servicePressurePsig: 400 })).toEqual(['pressure-class'])
    expect(codes('R-717', { spec: 'DOT-4AA480', servicePressurePsig: 479 })).toEqual(['pressure-class', 'toxic'])
    expect(codes('R-22', { spec: 'DOT-4B240ET', servicePressurePsig: 400 })).toEqual([])
  })

  it('takes a 3E without a mark as 1800 psig', () => {
    expect(codes('R-410A', { spec: 'DOT-3E', servicePressurePsig: null })).toEqual([])
    expect(codes('R-13', { spec: 'DOT-3E', servicePressurePsig: null })).toEqual([])
  })
})

describe('a DOT-39', () => {
  it('is never refilled, with whatever gas and even before one is named', () => {
    expect(codes('R-134a', { spec: 'DOT-39', servicePressurePsig: 260 })).toEqual(['not-refillable'])
    expect(codes(null, { spec: 'DOT-39' })).toEqual(['not-refillable'])
    expect(codes(null)).toEqual([])
  })
})

describe('a flammable refrigerant', () => {
  it.each(['R-32', 'R-152a', 'R-290', 'R-454B', 'R-1234yf'])('%s goes only into a cylinder marked for it', (refrigerant) => {
    expect(codes(refrigerant, { flammableMarked: false })).toEqual(['not-marked-flammable'])
    expect(codes(refrigerant, { flammableMarked: true })).toEqual([])
  })

  it('is any refrigerant without a known safety class, which counts as toxic too', () => {
    const finding = fitFindings({ stamp: stampOf({ flammableMarked: false }), refrigerant: 'R-0', catalogue: CATALOGUE })
    expect(finding.map(one => one.code)).toEqual(['pressure-class', 'not-marked-flammable', 'toxic'])
    expect(finding[2]?.severity).toBe('caution')
  })

  it('is a blend of which only the composition is known: no pressure and no class are known of it', () => {
    expect(codes('R-410B', { flammableMarked: false })).toEqual(['pressure-class', 'not-marked-flammable', 'toxic'])
    expect(codes('R-410B')).toEqual(['pressure-class', 'toxic'])
  })

  it('is not R-22', () => {
    expect(codes('R-22', { flammableMarked: false })).toEqual([])
  })
})

describe('a safety class', () => {
  it('that is only from memory says so', () => {
    const catalogue = {
      ...CATALOGUE,
      refrigerants: new Map([['R-123', { ...CATALOGUE.refrigerants.get('R-123')!, safetyClassStatus: 'from memory' }]]),
    }
    const findings = fitFindings({ stamp: stampOf(), refrigerant: 'R-123', catalogue })
    expect(findings[0]?.source).toBe('ANSI/ASHRAE Standard 34, class B1, from memory')
  })
})
