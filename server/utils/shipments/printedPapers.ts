import type { ShippingPapers } from '~~/utils/transport/shippingPapers'
import { billOfLading } from '~~/utils/document/billOfLading'
import { packingList } from '~~/utils/document/packingList'
import { shipmentWord } from '~~/utils/document/shipmentPaper'
import type { Database } from '../database/database'
import { paperPdf } from '../pdf/paperPdf'
import type { PapersAt } from './papers'
import { papersOf } from './papersOf'

/** The papers that travel with a shipment. */
export type PaperKind = 'bill-of-lading' | 'packing-list'

const DRAWN = { 'bill-of-lading': billOfLading, 'packing-list': packingList } as const
const TITLES = { 'bill-of-lading': 'Bill of lading', 'packing-list': 'Packing list' } as const

/** One of a shipment's papers as a PDF under its name; a draft says so on every page. Errors: as {@link papersOf}. */
export async function printedPaper(db: Database, shipmentId: string, kind: PaperKind, at: PapersAt): Promise<{ name: string, pdf: Buffer }> {
  const { papers, isDraft } = await papersOf(db, shipmentId, at)
  return { name: paperName(kind, papers), pdf: await paperPdfOf(kind, papers, isDraft) }
}

/** A paper drawn from what it says. */
export function paperPdfOf(kind: PaperKind, papers: ShippingPapers, isDraft: boolean): Promise<Buffer> {
  return paperPdf(DRAWN[kind](papers, isDraft), `${TITLES[kind]}, ${shipmentWord(papers)}`)
}

/** What a paper's file is called. @example 'bill-of-lading-0004.pdf' */
export function paperName(kind: PaperKind, { number }: Pick<ShippingPapers, 'number'>): string {
  return `${kind}-${String(number).padStart(4, '0')}.pdf`
}
