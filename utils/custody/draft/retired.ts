import { typedText, type DraftKind } from './draft'

/** What the form of a retirement holds. */
export interface RetiredDraft { reason: string, text: string, certificate: string, photoIds: string[] }

/** The form of a cylinder whose life ends, with the proof of what was done with it where there is one. */
export const RETIRED: DraftKind<'retired', RetiredDraft> = {
  empty: () => ({ reason: '', text: '', certificate: '', photoIds: [] }),
  read: (draft) => {
    const reason = typedText(draft.reason)
    if (reason === undefined) return { reason: 'Say why it is retired.' }
    const text = typedText(draft.text)
    const certificate = typedText(draft.certificate)
    const { photoIds } = draft
    const proof = { ...(text && { text }), ...(certificate && { certificate }), ...(photoIds.length > 0 && { photoIds: [...photoIds] }) }
    return { details: { reason, ...(Object.keys(proof).length > 0 && { proof }) } }
  },
  of: ({ reason, proof }) => ({ reason, text: proof?.text ?? '', certificate: proof?.certificate ?? '', photoIds: [...proof?.photoIds ?? []] }),
}
