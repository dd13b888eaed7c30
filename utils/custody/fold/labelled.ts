import { normaliseLabelCode } from '../../label/code'
import type { Turn } from './turn'

/** A label is stuck on. Whatever code was on before still opens the cylinder. */
export function labelled({ state, event }: Turn<'labelled'>): void {
  const code = labelledCode(event.details)
  const at = event.effectiveAt
  const known = state.labels.find(label => label.code === code)
  if (known) {
    known.lastAt = at
    delete known.replacedAt
  }
  else state.labels.push({ code, firstAt: at, lastAt: at })
  const replaced = event.details.replaces && normaliseLabelCode(event.details.replaces)
  if (replaced && replaced !== code) {
    for (const label of state.labels) if (label.code === replaced) label.replacedAt = at
  }
  state.labelCode = code
}

/** The code of a `labelled` event as it is stored everywhere else, however its sender wrote it. */
export function labelledCode(details: { code: string }): string {
  return normaliseLabelCode(details.code) ?? details.code
}
