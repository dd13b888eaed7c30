/** A text and who signed it. */
export interface SignedNote {
  /** Ends with a line break. */
  text: string
  signatures: NoteSignature[]
}

/** One signature of a note: base64 of the first four bytes of the key's id and the signature itself. */
export interface NoteSignature { name: string, base64: string }

const SIGNATURE_LINE = /^\u2014 ([^\s+]+) ([A-Za-z0-9+/]+={0,2})$/u

/** A note as it is kept and sent. Source: C2SP signed-note. */
export function writeNote({ text, signatures }: SignedNote): string {
  return `${text}\n${signatures.map(({ name, base64 }) => `\u2014 ${name} ${base64}\n`).join('')}`
}

/**
 * A note as it was written, or null where the text is none. Whether its signatures are good is not looked at.
 *
 * Source: C2SP signed-note: the last empty line parts the text from the signatures.
 */
export function readNote(note: string): SignedNote | null {
  const cut = note.lastIndexOf('\n\n')
  if (cut < 0 || !note.endsWith('\n')) return null
  const lines = note.slice(cut + 2, -1).split('\n')
  const signatures = lines.flatMap((line): NoteSignature[] => {
    const [, name, base64] = SIGNATURE_LINE.exec(line) ?? []
    return name === undefined || base64 === undefined ? [] : [{ name, base64 }]
  })
  return signatures.length === lines.length ? { text: note.slice(0, cut + 1), signatures } : null
}
