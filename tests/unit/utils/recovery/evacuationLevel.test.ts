import { describe, expect, it } from 'vitest'
import { requiredLevel } from '../../../../utils/recovery/evacuationLevel'
import { machineMadeBy } from '../../../../utils/recovery/machineMade'
import { systemDependentLimit } from '../../../../utils/recovery/systemDependentLimit'
import type { EvacuationInput } from '../../../../utils/recovery/types'
import { onGauges } from '../../../../utils/recovery/words'
import { CATALOGUE } from '../../../../utils/refrigerant/allRefrigerants'

function asked(designation: string | null, more: Partial<EvacuationInput> = {}) {
  return requiredLevel({
    refrigerant: designation === null ? null : CATALOGUE.refrigerants.get(designation)!,
    // 10 lb.
    chargeGrams: 4536,
    machineMade: 'since-1993-11-15', appliance: 'other', circumstances: 'major', compressorRuns: null,
    ...more,
  })
}

describe('what is not known about an appliance', () => {
  it('is taken as what asks for more, and said', () => {
    const { level, assumed } = asked('R-22', { chargeGrams: null, machineMade: null })
    expect(level).toEqual({ unit: 'inHg-vacuum', value: 10 })
    expect(assumed).toEqual([
      'The charge is not known: taken as 200 lb or more, which asks for more.',
      'The machine’s date is not known: taken as 15 Nov 1993 or later, which asks for more.',
    ])
  })

  it('is not called assumed where it makes no difference', () => {
    const { level, assumed, account } = asked('R-22', { machineMade: null })
    expect(level).toEqual({ unit: 'inHg-vacuum', value: 0 })
    expect(assumed).toEqual([])
    expect(account).toContainEqual({ term: 'Recovery machine', value: 'date not known', note: 'makes no difference here', isAssumed: false })
  })

  it('asks for 25 mmHg absolute where nobody knows the refrigerant, for no row asks for more', () => {
    const { level, assumed } = asked(null, { chargeGrams: null, machineMade: null })
    expect(level).toEqual({ unit: 'mmHg-absolute', value: 25 })
    expect(assumed).toEqual(['The refrigerant is not known: taken as low pressure, the row that asks for most.'])
  })

  it('takes an opening without a reason as a major one', () => {
    const { level, assumed } = asked('R-134a', { circumstances: null })
    expect(level).toEqual({ unit: 'inHg-vacuum', value: 10 })
    expect(assumed).toHaveLength(1)
  })

  it('counts a charge of nothing as a charge', () => {
    expect(asked('R-134a', { chargeGrams: 0 }).assumed).toEqual([])
  })
})

describe('a refrigerant near the bound of two classes', () => {
  it('is held to the class that asks for more: R-32 of 200 lb as high pressure', () => {
    const { level, pressureClass, assumed } = asked('R-32', { chargeGrams: 90_718 })
    expect({ level, pressureClass }).toEqual({ level: { unit: 'inHg-vacuum', value: 10 }, pressureClass: 'high' })
    expect(assumed.join()).toContain('near the bound of 355 psia between very high pressure and high pressure')
  })

  it('keeps its own class where both ask for the same', () => {
    const { level, pressureClass, assumed } = asked('R-32', { chargeGrams: 90_717 })
    expect({ level, pressureClass, assumed }).toEqual({ level: { unit: 'inHg-vacuum', value: 0 }, pressureClass: 'very-high', assumed: [] })
  })

  it('is held to the lower pressure too where that asks for more: R-409A of 10 lb as medium pressure', () => {
    expect(asked('R-409A')).toMatchObject({ level: { unit: 'inHg-vacuum', value: 10 }, pressureClass: 'medium' })
  })

  it('leaves the class open where the charge and the machine are not known either', () => {
    expect(asked('R-409A', { chargeGrams: null, machineMade: null }).level).toEqual({ unit: 'inHg-vacuum', value: 15 })
  })
})

describe('why an appliance is opened', () => {
  it('leaves 0 psig for a repair that is not major, whatever the row', () => {
    expect(asked('R-134a', { chargeGrams: 200_000, circumstances: 'minor-repair' }).level).toEqual({ unit: 'psig', value: 0 })
    expect(asked('R-123', { circumstances: 'minor-repair' }).level).toEqual({ unit: 'psig', value: 0 })
  })

  it('brings a low-pressure appliance up without nitrogen where it boils below 85 °F, by heat first above it', () => {
    const said = (designation: string) => asked(designation, { circumstances: 'minor-repair' }).exceptions.map(({ text }) => text).join()
    // R-123 boils at 82 °F, R-113 at 118 °F.
    expect(said('R-123')).toContain('without nitrogen')
    expect(said('R-113')).toContain('by heat')
    expect(said('R-22')).not.toContain('nitrogen')
  })

  it('leaves 5 psig for an oil change', () => {
    expect(asked('R-22', { circumstances: 'oil-change' }).level).toEqual({ unit: 'psig', value: 5 })
  })

  it('keeps the table for the sound parts of a leaking appliance, and 0 psig at most for the leaking ones', () => {
    expect(asked('R-134a', { circumstances: 'leaking' })).toMatchObject({ level: { unit: 'inHg-vacuum', value: 10 }, leakingParts: { unit: 'psig', value: 0 } })
    expect(asked('R-134a').leakingParts).toBeNull()
  })

  it('says that carbon dioxide is exempt', () => {
    expect(asked('R-744').exceptions[0]).toMatchObject({ source: '40 CFR 82.154(a)(1)' })
    expect(asked('R-22').exceptions.map(({ source }) => source)).not.toContain('40 CFR 82.154(a)(1)')
  })
})

describe('a small appliance', () => {
  it('of more than 5 lb is none, and goes by the table', () => {
    expect(asked('R-22', { appliance: 'small', chargeGrams: 2268 }).level.unit).toBe('percent-of-charge')
    const { level, assumed } = asked('R-22', { appliance: 'small', chargeGrams: 2269 })
    expect(level).toEqual({ unit: 'inHg-vacuum', value: 0 })
    expect(assumed).toEqual(['More than 5.0 lb (2.27 kg) is no small appliance (40 CFR 82.152): taken as any other.'.replace(/(\d) (lb|kg)/g, '$1\u00A0$2')])
  })

  it('of which nothing is known must give 90 %, and both assumptions are said', () => {
    const { level, assumed } = asked('R-134a', { appliance: 'small', chargeGrams: null, machineMade: null })
    expect(level).toEqual({ unit: 'percent-of-charge', value: 90 })
    expect(assumed).toHaveLength(2)
  })

  it('with a dead compressor must give 80 % to either machine', () => {
    const { level, assumed } = asked('R-134a', { appliance: 'small', chargeGrams: 500, machineMade: null, compressorRuns: false })
    expect({ level, assumed }).toEqual({ level: { unit: 'percent-of-charge', value: 80 }, assumed: [] })
  })
})

describe('the date of a recovery machine', () => {
  it('is before 15 November 1993, or that day and after', () => {
    expect(machineMadeBy('1993-11-14')).toBe('before-1993-11-15')
    expect(machineMadeBy('1993-11-15')).toBe('since-1993-11-15')
  })

  it('by month and year tells only what it tells', () => {
    expect(['1993-10', '1993-11', '1993-12'].map(machineMadeBy)).toEqual(['before-1993-11-15', null, 'since-1993-11-15'])
    expect(['1992', '1993', '1994'].map(machineMadeBy)).toEqual(['before-1993-11-15', null, 'since-1993-11-15'])
  })
})

describe('the appliance’s own compressor', () => {
  it('does up to 15 lb, and not a gram that a scale can tell above it', () => {
    // 15 lb = 6803.9 g.
    expect(systemDependentLimit({ chargeGrams: 6804, isFixedPumpOut: false })).toBeNull()
    expect(systemDependentLimit({ chargeGrams: 6805, isFixedPumpOut: false })).toMatchObject({ source: '40 CFR 82.156(e)' })
  })

  it('does any charge as a fixed pump-out unit, and answers nothing for one that nobody knows', () => {
    expect(systemDependentLimit({ chargeGrams: 90_000, isFixedPumpOut: true })).toBeNull()
    expect(systemDependentLimit({ chargeGrams: null, isFixedPumpOut: false })).toBeNull()
  })
})

describe('a level on other gauges', () => {
  it('is rounded to the deeper vacuum', () => {
    // 25 / 25.4 = 0.98425; 29.9 - 0.98425 = 28.91575. (29.9 - 15) x 25.4 = 378.46.
    expect(onGauges({ unit: 'mmHg-absolute', value: 25 })).toEqual({ inHg: 28.92, mmHgAbsolute: 25, microns: 25_000 })
    expect(onGauges({ unit: 'inHg-vacuum', value: 15 })).toEqual({ inHg: 15, mmHgAbsolute: 378, microns: 378_000 })
  })

  it('follows the barometer, and never asks a gauge for less than 0', () => {
    // 10 inHg below 29.9 leaves 19.9, which a gauge in thin air of 24.9 inHg shows as 5.
    expect(onGauges({ unit: 'inHg-vacuum', value: 10 }, 24.9)).toMatchObject({ inHg: 5 })
    expect(onGauges({ unit: 'inHg-vacuum', value: 0 }, 24.9)).toMatchObject({ inHg: 0 })
  })

  it('is none for a share of the charge', () => {
    expect(onGauges({ unit: 'percent-of-charge', value: 90 })).toBeNull()
  })
})
