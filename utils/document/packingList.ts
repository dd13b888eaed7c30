import { CONDITION_WORDS } from '../custody/words'
import type { Condition } from '../custody/cylinderView'
import { formatLabelCode } from '../label/code'
import { formatMass, formatReading, type MassUnit } from '../quantity/mass'
import type { DescribedLine, ShippingPapers } from '../transport/shippingPapers'
import { cautionsFor, STANDING_CAUTION } from './cautions'
import type { Paper } from './paper'
import type { TableColumn } from './paperTable'
import { draftMark, shipmentWord } from './shipmentPaper'

const COLUMNS: readonly TableColumn[] = [
  { head: 'No.', share: 6, align: 'right', face: 'figures' },
  { head: 'Serial', share: 17, face: 'figures' },
  { head: 'Code', share: 18, face: 'figures' },
  { head: 'Refrigerant', share: 16 },
  { head: 'Condition', share: 12 },
  { head: 'TW', share: 14, align: 'right', face: 'figures' },
  { head: 'Gross', share: 14, align: 'right', face: 'figures' },
  { head: 'Net', share: 14, align: 'right', face: 'figures' },
  { head: 'Retest due', share: 22 },
  { head: 'Notes', share: 12 },
]

/** The packing list of a shipment: each cylinder by its serial with tare, gross and net, for both ends to tick off and sign. */
export function packingList(papers: ShippingPapers, isDraft: boolean): Paper {
  const { shipper, consignee, day, lines, totals, unit } = papers
  const name = `Packing list, ${shipmentWord(papers)}`
  return {
    sender: [shipper.name, ...shipper.telephone === null ? [] : [`Telephone ${shipper.telephone}`], day],
    foot: `${name}, ${day}`,
    ...draftMark(isDraft),
    blocks: [
      { kind: 'title', text: name },
      { kind: 'facts', rows: [{ term: 'To', value: [consignee.name, ...consignee.address === null ? [] : [consignee.address]].join('\n') }] },
      {
        kind: 'table', columns: COLUMNS,
        rows: lines.map((line, index) => lineRow(line, index + 1, unit)),
        totals: ['', `${totals.cylinders} cyl.`, '', '', '', '', sumText(totals.grossGrams, unit), sumText(totals.netGrams, unit), '', ''],
      },
      { kind: 'text', text: 'TW is the tare weight in force, gross as it was read on the scale, net what is in it.' },
      ...[...cautionsFor(['moving']), STANDING_CAUTION].map(text => ({ kind: 'item' as const, text })),
      { kind: 'signatures', lines: ['Loaded by', 'Day', 'Received by', 'Day'] },
    ],
  }
}

function lineRow(line: DescribedLine, number: number, unit: MassUnit): string[] {
  const { serial, labelCode, contents: { refrigerant, condition }, tareWeight, gross, netGrams, retest, notes, isResidue } = line
  return [
    String(number),
    serial ?? 'not known',
    labelCode === null ? 'no label' : formatLabelCode(labelCode),
    refrigerant ?? (condition === 'mixed' ? 'mixed' : 'not known'),
    CONDITION_WORDS[condition as Condition] ?? condition,
    tareWeight === null ? 'not known' : formatReading(tareWeight),
    gross === null ? 'not weighed' : formatReading(gross),
    netGrams === null ? 'not known' : formatMass(netGrams, unit, 'nearest'),
    retest,
    [...isResidue ? ['residue'] : [], ...notes].join(', '),
  ]
}

function sumText(grams: number | null, unit: MassUnit): string {
  return grams === null ? 'not known' : formatMass(grams, unit, 'nearest')
}
