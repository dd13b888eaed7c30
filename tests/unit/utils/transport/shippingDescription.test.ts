import { describe, expect, it } from 'vitest'
import { CATALOGUE } from '~~/utils/refrigerant/allRefrigerants'
import { shippedContents } from '~~/utils/transport/shippedContents'
import type { Classification } from '~~/utils/transport/shipperEntries'
import { shippingDescription, unclassified, type ShippedContents } from '~~/utils/transport/shippingDescription'

describe('what a cylinder is described as', () => {
  it('proposes a non-flammable entry for mixed refrigerants that do not burn, names what is known, and waits for the shipper', () => {
    const told = described({ condition: 'mixed', knownParts: ['R-22', 'R-134a'] })
    expect(told).toMatchObject({ identification: null, text: 'Not classified', needsChoice: true, basis: 'judgement' })
    expect(told.proposal).toMatchObject({ identification: 'UN1078', technicalNames: ['chlorodifluoromethane', '1,1,1,2-tetrafluoroethane'] })
    expect(told.because).toContain('49 CFR 173.22')
  })

  it('proposes a flammable entry where one part may make the vapor burn', () => {
    const told = described({ condition: 'mixed', knownParts: ['R-22', 'R-290'] })
    expect(told.proposal).toMatchObject({ identification: 'UN3161', technicalNames: ['chlorodifluoromethane', 'propane'] })
    expect(told.because).toContain('R-290 may make its vapor burn')
    expect(told.because).toContain('NA1954')
  })

  it('takes mixed refrigerants for mixed, whichever of them is named', () => {
    expect(described({ refrigerant: 'R-22', condition: 'mixed', knownParts: ['R-134a', 'R-22'] })).toMatchObject({ needsChoice: true, proposal: { identification: 'UN1078' } })
  })

  it('counts a part whose safety class is not held as one that burns', () => {
    expect(described({ condition: 'mixed', knownParts: ['R-22', 'R-406A'] }).proposal?.identification).toBe('UN3161')
  })

  it.each([
    ['of which one part is known', ['R-22']],
    ['with ammonia in it', ['R-22', 'R-717']],
    ['with sulfur dioxide in it', ['R-764', 'R-22']],
  ])('proposes nothing for a mixture %s', (_what, knownParts) => {
    expect(described({ condition: 'mixed', knownParts })).toMatchObject({ proposal: null, needsChoice: true })
  })

  it('proposes nothing for contents that nobody knows, whatever was once in it', () => {
    expect(described({ condition: 'unknown', knownParts: ['R-22', 'R-134a'] })).toMatchObject({ proposal: null, needsChoice: true, because: expect.stringContaining('not known') })
  })

  it('describes what the shipper has chosen, with its technical names and reason', () => {
    const told = described({ condition: 'unknown', knownParts: [] }, { identification: 'NA1954', technicalNames: ['difluoromethane'], reason: 'the analysis found R-32' })
    expect(told.text).toBe('NA1954, Refrigerant gases, n.o.s. (difluoromethane), 2.1')
    expect(told).toMatchObject({ needsChoice: false, basis: 'judgement', source: '49 CFR 173.22', because: 'The shipper’s judgement: the analysis found R-32' })
  })

  it('puts the shipper\'s choice above the row of the table: recovered refrigerant may hold more than its name says', () => {
    const told = described({ refrigerant: 'R-22', condition: 'suspect' }, { identification: 'UN1078', technicalNames: ['chlorodifluoromethane', 'air'], reason: 'air in it' })
    expect(told.text).toBe('UN1078, Refrigerant gases, n.o.s. (chlorodifluoromethane, air), 2.2')
  })

  it('lets the shipper find that it is no gas of Class 2', () => {
    const told = described({ refrigerant: 'R-123' }, { identification: 'not-a-gas', technicalNames: [], reason: 'a liquid that 49 CFR does not regulate' })
    expect(told).toMatchObject({ identification: null, division: null, needsChoice: false, text: 'No gas of Class 2, by the shipper’s judgement' })
  })

  it('asks nobody about an evacuated cylinder, and calls what was emptied by what was in it', () => {
    expect(described({ condition: 'clean', knownParts: [], nothingInIt: true })).toMatchObject({ identification: null, needsChoice: false, text: 'Nothing in it' })
    const emptied = { refrigerant: null, condition: 'clean' as const, nothingInIt: true, knownSinceVacuum: ['R-22'] }
    expect(shippingDescription(shippedContents(emptied), CATALOGUE).text).toBe('UN1018, Refrigerant gas R 22, 2.2')
    expect(shippedContents({ ...emptied, knownSinceVacuum: ['R-22', 'R-32'] })).toMatchObject({ refrigerant: null, condition: 'mixed' })
  })

  it('lists the lines that wait for the shipper', () => {
    const lines = [{ id: 'a', description: described({ refrigerant: 'R-22' }) }, { id: 'b', description: described({ condition: 'unknown' }) }]
    expect(unclassified(lines).map(({ id }) => id)).toEqual(['b'])
  })
})

function described(contents: Partial<ShippedContents>, choice: Classification | null = null) {
  const { refrigerant = null } = contents
  return shippingDescription({ refrigerant, condition: 'clean', knownParts: refrigerant === null ? [] : [refrigerant], nothingInIt: false, ...contents }, CATALOGUE, choice)
}
