import type { PressureCheckAnswer, PressureCheckQuery } from '~~/utils/contract/pressureCheck'
import { pressureCheck, whyNoCheck } from '~~/utils/refrigerant/pressureCheck'
import { fullReading } from '~~/utils/refrigerant/pressureReading'
import { problem } from '../http/problem'
import { refrigerantNamed } from './refrigerants'

/** A cylinder's pressure against the band of a refrigerant. Errors: 404; 422 where no check is possible at the temperature. */
export function pressureCheckAnswer({ refrigerant: designation, ...reading }: PressureCheckQuery): PressureCheckAnswer {
  const refrigerant = refrigerantNamed(designation)
  const because = whyNoCheck(refrigerant, reading.temperatureC)
  if (because !== null) {
    throw problem(422, 'No check is possible', because, [{ path: 'temperatureC', message: 'is outside the table of this refrigerant' }])
  }
  return { refrigerant: refrigerant.designation, ...pressureCheck({ ...fullReading(reading), refrigerant }) }
}
