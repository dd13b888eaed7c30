import type { Finding } from '../finding'
import type { Hold } from '../cylinderView'
import type { StateHold } from '../state'
import { setApart } from './record'
import { damaged, rejected, tareLoss, wet } from './retest'

const TEXTS: Record<Hold, (since: number, reasons: readonly string[]) => Finding> = { 'quarantined': setApart, damaged, 'tare-loss': tareLoss, rejected, wet }

/** What a hold says to the person at the cylinder. */
export function holdFinding({ hold, since, reasons }: StateHold): Finding {
  return TEXTS[hold](since, reasons)
}
