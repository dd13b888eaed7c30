import type { DockLine } from '~~/utils/dock/dockLines'
import type { StatusKind } from '~~/utils/picture/status'
import { formatReading, type MassReading } from '~~/utils/quantity/mass'
import { grossApartGrams } from './grossApart'

/** What a line of the dock's list says of a cylinder, and how it is drawn. */
export function lineWord(line: DockLine | undefined, ourGross: MassReading | null): { kind: StatusKind, text: string } {
  if (!line) return { kind: 'unk', text: 'not looked at' }
  if (line.missing) return { kind: 'att', text: 'not here' }
  const weight = line.theirGross === null ? 'not weighed' : formatReading(line.theirGross)
  if (line.sentBack) return { kind: 'away', text: `sent back, ${weight}` }
  const faults = [
    ...(line.damage === null ? [] : ['damaged']),
    ...(line.overdue ? ['retest date passed'] : []),
    ...(line.theirGross !== null && ourGross !== null && grossApartGrams(line.theirGross, ourGross) !== null ? ['weight differs'] : []),
  ]
  if (faults.length > 0) return { kind: 'att', text: [weight, ...faults].join(', ') }
  return line.theirGross === null ? { kind: 'unk', text: 'here, not weighed' } : { kind: 'ok', text: `here, ${weight}` }
}
