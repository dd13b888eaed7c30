import { formatMass, type MassUnit } from '../quantity/mass'
import { isHazardous } from '../transport/shippingDescription'
import type { DescribedGroup, Party, ShippingPapers } from '../transport/shippingPapers'
import { cautionsFor, STANDING_CAUTION } from './cautions'
import type { Paper, PaperBlock } from './paper'
import { draftMark, shipmentWord } from './shipmentPaper'

/**
 * The bill of lading of a shipment: what travels, how it is described, what the vehicle shows, and what is signed.
 *
 * Source: 49 CFR 172.201, 172.202, 172.203, 172.204, 172.504, 172.604.
 */
export function billOfLading(papers: ShippingPapers, isDraft: boolean): Paper {
  const { shipper, consignee, day, groups, totals, unit } = papers
  const name = `Bill of lading, ${shipmentWord(papers)}`
  return {
    sender: [shipper.name, day],
    foot: `${name}, ${day}`,
    ...draftMark(isDraft),
    blocks: [
      { kind: 'title', text: name },
      { kind: 'facts', rows: [
        { term: 'Shipper', value: [shipper.name, ...linesOf(shipper)].join('\n') },
        { term: 'Consignee', value: [consignee.name, ...linesOf(consignee)].join('\n') },
        { term: 'Carrier', value: carrierText(papers) },
        { term: 'Emergency telephone', value: emergencyText(papers) },
        ...papers.note === null ? [] : [{ term: 'Note', value: papers.note }],
      ] },
      {
        kind: 'table',
        columns: [
          { head: 'HM', share: 5 }, { head: 'Packages', share: 11 }, { head: 'Description', share: 52 },
          { head: 'Gross', share: 14, align: 'right', face: 'figures' }, { head: 'Net', share: 14, align: 'right', face: 'figures' },
        ],
        rows: groups.map(group => groupRow(group, unit)),
        totals: ['', `${totals.cylinders} cyl.`, 'All together', massText(totals.grossGrams, unit), massText(totals.netGrams, unit)],
      },
      ...isDraft && papers.missing.length > 0 ? [heading('Missing before it may leave'), ...items(papers.missing.map(({ text, source }) => `${text} (${source})`))] : [],
      heading('Shipper’s certification'),
      { kind: 'text', text: papers.certification.text, keepsNext: true },
      {
        kind: 'text', keepsNext: true,
        text: `${papers.certification.because} Wording: ${papers.certification.source}. The shipper keeps a copy for 2 years after the first carrier has accepted it (49 CFR 172.201(e)).`,
      },
      { kind: 'signatures', lines: [`For ${shipper.name}`, 'Day', 'Accepted by the carrier', 'Day of acceptance'] },
      heading('Placards of this load'),
      { kind: 'text', text: placardText(papers) },
      ...items(papers.placards.notes),
      ...judged(groups),
      ...papers.reliefs.length > 0 ? [heading('What the regulation eases for residue'), ...items(papers.reliefs.map(({ cylinders, text, conditions, source }) => `${cylinders} cyl.: ${text} ${conditions} (${source})`))] : [],
      ...papers.tradeException.state === 'may' ? [heading('Materials of trade'), ...items(papers.tradeException.because)] : [],
      heading('Take care'),
      ...items([...cautionsFor(['moving', 'handling']), STANDING_CAUTION]),
    ],
  }
}

function groupRow(group: DescribedGroup, unit: MassUnit): string[] {
  const { description, isResidue, cylinders } = group
  return [
    isHazardous(description) ? 'X' : '',
    `${cylinders} cyl.`,
    isResidue ? `${description.text}. RESIDUE: Last Contained` : description.text,
    massText(group.grossGrams, unit), massText(group.netGrams, unit),
  ]
}

function judged(groups: readonly DescribedGroup[]): PaperBlock[] {
  const open = groups.map(({ description }) => description).filter(({ basis, identification }) => basis !== 'listed' || identification === null)
  const said = new Map(open.map(({ text, because, basis, source }) => [text, `${text}: ${because} (${source}${basis === 'from-memory' ? ', from memory' : ''})`]))
  return said.size > 0 ? [heading('What is judgement, or from memory'), ...items([...said.values()])] : []
}

function placardText({ placards: { state, names } }: ShippingPapers): string {
  if (state === 'needed') return `${names.join(' and ')}, on each side and each end of the vehicle (49 CFR 172.504).`
  return state === 'not-known' ? 'Not known until every cylinder is weighed.' : 'None is needed for this load by itself.'
}

function carrierText({ carriage }: ShippingPapers): string {
  switch (carriage.by) {
    case 'carrier': return [carriage.carrier.name, ...linesOf(carriage.carrier)].join('\n')
    case 'own-vehicle': return 'the shipper, on its own vehicle'
    case 'not-said': return 'not said yet'
  }
}

function emergencyText({ emergency: { telephone, contract } }: ShippingPapers): string {
  if (!telephone) return 'not set'
  return contract ? `${telephone}, contract ${contract}` : telephone
}

function linesOf({ address, telephone }: Party): string[] {
  return [...address === null ? [] : [address], ...telephone === null ? [] : [`Telephone ${telephone}`]]
}

function massText(grams: number | null, unit: MassUnit): string {
  return grams === null ? 'not known' : formatMass(grams, unit, 'nearest')
}

function heading(text: string): PaperBlock {
  return { kind: 'heading', text }
}

function items(texts: readonly string[]): PaperBlock[] {
  return texts.map(text => ({ kind: 'item', text }))
}
