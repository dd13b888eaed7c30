import type { LabelFace } from '~~/utils/label/drawing'

/** The font files of a label's four faces. */
export type LabelFonts = Record<LabelFace, Buffer>

/** The files in server/assets/fonts, Latin letters only, under the SIL Open Font License beside them. */
export const LABEL_FONT_FILES: Record<LabelFace, string> = {
  'figures': 'roboto-mono-500.woff',
  'figures-bold': 'roboto-mono-700.woff',
  'words': 'barlow-600.woff',
  'words-bold': 'barlow-700.woff',
}

/**
 * The font files that the papers are set in, from the server's own assets.
 *
 * Errors: Error where the build has left one out.
 */
export async function labelFonts(): Promise<LabelFonts> {
  const assets = useStorage('assets:server')
  const read = async (file: string): Promise<Buffer> => {
    const bytes = await assets.getItemRaw<Uint8Array>(`fonts/${file}`)
    if (!bytes) throw new Error(`The font ${file} is missing from the server's assets`)
    return Buffer.from(bytes)
  }
  const faces = Object.entries(LABEL_FONT_FILES) as [LabelFace, string][]
  return Object.fromEntries(await Promise.all(faces.map(async ([face, file]) => [face, await read(file)]))) as LabelFonts
}
