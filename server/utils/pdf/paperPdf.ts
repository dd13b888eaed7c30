import { PAPER_MM, paperPages, type Paper } from '~~/utils/document/paper'
import { labelFonts } from './fonts'
import { labelSheetPdf } from './labelSheetPdf'

/** A paper as a PDF on letter paper, with the fonts in it. */
export async function paperPdf(paper: Paper, title: string): Promise<Buffer> {
  const pages = paperPages(paper).map(label => [{ position: 1, x: 0, y: 0, symbol: null, label }])
  return labelSheetPdf({ page: PAPER_MM, pages }, await labelFonts(), { title })
}
