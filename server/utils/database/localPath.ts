import { fileURLToPath } from 'node:url'

/** The file that a `file:` URL of the database names. */
export function localPath(url: string): string {
  if (url.startsWith('file://')) return fileURLToPath(url)
  return url.slice('file:'.length).split('?')[0] ?? ''
}
