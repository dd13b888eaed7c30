import { text } from 'node:stream/consumers'
import { expect, it } from 'vitest'
import { csvStream, type CsvLine } from '../../../server/utils/csv/csvStream'

async function written(...lines: CsvLine[]): Promise<string[]> {
  async function* blocks() {
    yield lines
  }
  return (await text(csvStream(['Head'], blocks()))).split('\r\n').slice(1, -1)
}

it('keeps a text that a stranger wrote from being worked out as a formula by a spreadsheet', async () => {
  expect(await written(['=1+1'], ['@SUM(A1)'], ['-2+3'], ['+1-800'], ['\tx'])).toEqual(['\'=1+1', '\'@SUM(A1)', '\'-2+3', '\'+1-800', '\'\tx'])
})

it('leaves figures and other texts as they are', async () => {
  expect(await written([-39], ['-10.5'], ['+15550100'], ['–'], ['A=1'], [''], [null])).toEqual(['-39', '-10.5', '+15550100', '–', 'A=1', '', ''])
})
