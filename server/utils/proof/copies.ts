import { appendFileSync, existsSync, readFileSync } from 'node:fs'

/** Keeps a copy of a checkpoint outside the database: a line of JSON each, in a file that only grows. */
export function keepCopy(file: string, note: string): void {
  appendFileSync(file, `${JSON.stringify(note)}\n`, { mode: 0o600 })
}

/** The checkpoints whose copies were kept, oldest first. */
export function keptCopies(file: string): string[] {
  if (!existsSync(file)) return []
  return readFileSync(file, 'utf8').split('\n').flatMap((line): string[] => {
    try {
      const note: unknown = JSON.parse(line)
      return typeof note === 'string' ? [note] : []
    }
    catch {
      // A power cut may have left half a line.
      return []
    }
  })
}
