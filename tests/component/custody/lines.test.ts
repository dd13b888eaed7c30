import { describe, expect, it } from 'vitest'
import { lineVerb, lineWords } from '~~/components/custody/lines'
import type { LogLine } from '~~/utils/custody/cylinderView'

const checked = (details: object) => ({ kind: 'checked', details, names: {}, place: null }) as unknown as LogLine
const said = (details: object) => lineWords(checked(details)).what.replaceAll('\u00A0', ' ')
const read = (kind: string, details: object, names = {}) => lineWords({ kind, details, names, place: null } as unknown as LogLine)

describe('a check in the custody log', () => {
  it('reads as it was done: the gauge and the thermometer on both scales, and the barometer where one was read', () => {
    expect(lineVerb(checked({ method: 'pressure' }))).toBe('Checked')
    const reading = { method: 'pressure', pressureKPa: 1091.412, temperatureC: 26.667 }
    expect(said(reading)).toBe('pressure 143.6 psig at 80.0 °F (9.90 bar at 26.7 °C)')
    expect(said({ ...reading, barometerKPa: 84.321 })).toBe('pressure 143.6 psig at 80.0 °F (9.90 bar at 26.7 °C), barometer 24.9 inHg (84.3 kPa)')
  })

  it('says what an analysis found, and that it named none', () => {
    const composition = [{ component: 'R-22', massPercent: 87.4 }, { component: 'air', massPercent: 0 }]
    expect(said({ method: 'identifier', composition, verdict: { refrigerant: 'R-22', condition: 'suspect' } })).toBe('by identifier: R-22, suspect; R-22 87.4 %, air 0 %')
    expect(said({ method: 'laboratory', verdict: { refrigerant: null, condition: 'mixed' } })).toBe('by laboratory: refrigerant not named, mixed')
  })
})

describe('the care of a cylinder in the custody log', () => {
  it('reads with what an outside look found', () => {
    expect(read('inspected', { result: 'sound' }).what).toBe('no damage seen outside')
    expect(read('inspected', { result: 'damaged', reasons: ['corrosion', 'dent'] }).what).toBe('damaged: dent, corrosion')
    expect(read('inspected', { result: 'damaged' }).what).toBe('damaged')
  })

  it('reads with the reason it was set apart or released for', () => {
    expect(read('quarantined', { reason: 'oil at the valve' }).what).toBe('oil at the valve')
    expect(lineVerb({ kind: 'quarantined' } as LogLine)).toBe('Set apart')
    expect(read('released', { reason: 'valve is dry' }).what).toBe('valve is dry')
  })

  it('reads with where it was last seen, and where it was found', () => {
    expect(read('missing', { lastSeen: 'by the roof door' }).what).toBe('last seen: by the roof door')
    expect(read('missing', {}).what).toBe('nobody finds it')
    expect(read('found', {}).what).toBe('where the log had it')
    expect(read('found', { placeId: 'p' }, { p: 'South shop' })).toMatchObject({ what: 'at South shop', to: 'South shop' })
  })

  it('reads with why it was retired and what proves it', () => {
    expect(read('retired', { reason: 'scrapped' }).what).toBe('scrapped')
    expect(read('retired', { reason: 'scrapped', proof: { text: 'hole drilled', certificate: 'S-114', photoIds: ['a', 'b'] } }).what).toBe('scrapped; hole drilled; certificate S-114; 2 photos')
  })
})
