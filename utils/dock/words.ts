import { formatReading } from '../quantity/mass'
import type { DockEntry } from './entry'

/** An entry in words, as the dock and the shipment's history say it. */
export function dockWords(entry: DockEntry): string {
  switch (entry.kind) {
    case 'here': return 'It is here'
    case 'gross': return `Gross ${formatReading(entry.said.gross)}`
    case 'damaged': return `Damaged: ${entry.said.what}`
    case 'overdue': return 'Retest date passed'
    case 'missing': return 'Not here'
    case 'unexpected': return `Not on the papers: serial ${entry.said.serial}${entry.said.what === null ? '' : `, ${entry.said.what}`}`
    case 'graded': return [
      entry.said.grade === null ? null : `Grade ${entry.said.grade}`,
      entry.said.acceptedNet === null ? null : `accepted net ${formatReading(entry.said.acceptedNet)}`,
    ].filter(part => part !== null).join(', ').replace(/^a/, 'A')
    case 'sent-back': return `Sent back${entry.said.because === null ? '' : `: ${entry.said.because}`}`
    case 'taken-out': return 'An entry was taken out'
  }
}
