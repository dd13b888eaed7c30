import { normaliseLabelCode } from '../../label/code'
import { typedText, type DraftKind } from './draft'

export interface LabelledDraft { code: string, replaces: boolean, replacedCode: string, reason: string }

/** The form of a label that was stuck on. */
export const LABELLED: DraftKind<'labelled', LabelledDraft> = {
  empty: ({ view }) => ({ code: '', replaces: view.labelCode !== null, replacedCode: view.labelCode ?? '', reason: '' }),
  read: ({ code, replaces, replacedCode, reason }) => {
    const normal = normaliseLabelCode(code)
    if (normal === null) return { reason: 'Scan the label, or type its nine characters.' }
    if (replaces && normal === replacedCode) return { reason: 'That label is on it already.' }
    return { details: { code: normal, ...(replaces && replacedCode && { replaces: replacedCode }), ...(typedText(reason) && { reason: typedText(reason) }) } }
  },
  of: ({ code, replaces, reason }) => ({ code, replaces: replaces !== undefined, replacedCode: replaces ?? '', reason: reason ?? '' }),
}
