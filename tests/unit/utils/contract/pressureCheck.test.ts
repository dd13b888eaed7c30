import { describe, expect, it } from 'vitest'
import { pressureCheckQuery } from '~~/utils/contract/pressureCheck'

function faults(query: Record<string, string>): string[] {
  return pressureCheckQuery.safeParse({ refrigerant: 'R-22', ...query }).error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`) ?? []
}

describe('what is asked of a pressure', () => {
  it('is only called no number where it is none', () => {
    expect(faults({ pressureKPa: 'high', temperatureC: '26.7' })).toEqual(['pressureKPa: must be a number of kPa'])
    expect(faults({ pressureKPa: '1091', temperatureC: '26.7', barometerKPa: 'fair' })).toEqual(['barometerKPa: must be a number of kPa'])
  })

  it('is a vacuum that the barometer allows', () => {
    expect(faults({ pressureKPa: '17.1', temperatureC: '26.7', barometerKPa: '84.3' })).toEqual([])
    expect(faults({ pressureKPa: '17.1', temperatureC: '26.7', barometerKPa: '84.2' })).toEqual(['pressureKPa: is a deeper vacuum than this barometer allows'])
  })
})
