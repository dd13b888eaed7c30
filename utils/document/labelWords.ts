import { LEAST_MODULE_MM, type ModuleSize } from '../label/moduleSize'
import { NARROW_MM } from '../label/diameter'
import type { HostBudget } from '../label/symbol'
import { HOST_CHARACTERS, STRONGEST_HOST_CHARACTERS } from '../label/symbol'
import type { StatusKind } from '../picture/status'

/** What the print dialog says of the symbol, and how gravely. */
export interface SymbolWords { kind: StatusKind, text: string }

/** How a symbol comes out, in words; `diameterMm` is null for a flat place. */
export function symbolWords(size: ModuleSize, diameterMm: number | null): SymbolWords {
  switch (size.is) {
    case 'too-curved': return {
      kind: 'stop',
      text: 'Too narrow: round this curve a tilted phone would not read the symbol. Stick the label on the flat of the guard, and print it for a flat place.',
    }
    case 'no-room': return {
      kind: 'stop',
      text: `The address of this server is too long for labels of this size: the modules would be under ${LEAST_MODULE_MM} mm. Take larger labels.`,
    }
    case 'at-the-limit': return {
      kind: 'att',
      text: `${inMm(size)} It is read straight on, and not much tilted: the flat of the guard is the better place. ${ALONG}`,
    }
  }
  return { kind: 'ok', text: `${inMm(size)}${diameterMm !== null && diameterMm < NARROW_MM ? ` ${ALONG}` : ''}` }
}

const ALONG = 'Stick it on with its long edge along the cylinder; vinyl follows the curve best.'

function inMm({ moduleMm, sideMm }: { moduleMm: number, sideMm: number }): string {
  return `A symbol of ${sideMm.toFixed(1)} mm, its modules ${moduleMm.toFixed(2)} mm.`
}

/** What the length of the server's host makes of the labels, in words. */
export function hostWords({ hostCharacters, version, modules, level, isLong }: HostBudget): SymbolWords {
  const symbol = `The host of this address has ${hostCharacters} characters: a symbol of version ${version}, ${modules} modules a side, level ${level}.`
  if (isLong) {
    return { kind: 'att', text: `${symbol} Up to ${HOST_CHARACTERS} characters it would have 29 modules: these print smaller and are read from less far. A shorter host is best chosen before the first label is printed.` }
  }
  if (level === 'H') return { kind: 'ok', text: `${symbol} It stands the most dirt and wear.` }
  return { kind: 'ok', text: `${symbol} ${HOST_CHARACTERS} is the most for this size; with ${STRONGEST_HOST_CHARACTERS} or fewer it would be level H, which stands more dirt.` }
}
