import type { Finding } from '../finding'
import type { StateHold } from '../state'
import { damaged, rejected, tareLoss, wet } from './retest'

const TEXTS: Record<StateHold, (since: number) => Finding> = { damaged, 'tare-loss': tareLoss, rejected, wet }

/** What a hold says to the person at the cylinder. */
export function holdFinding({ hold, since }: { hold: StateHold, since: number }): Finding {
  return TEXTS[hold](since)
}
