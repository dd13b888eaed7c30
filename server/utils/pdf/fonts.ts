import type { LabelFace } from '~~/utils/label/drawing'

/** The font files of a label's four faces: the face's own, then those that stand in for a letter it lacks. */
export type LabelFonts = Record<LabelFace, readonly [Buffer, ...Buffer[]]>

type FontFiles = readonly [string, ...string[]]

const FIGURES = ofWeight(500)
const FIGURES_BOLD = ofWeight(700)

/** The files in server/assets/fonts, under the SIL Open Font License beside them. Barlow has Latin letters alone: the Greek and the Cyrillic of its words are Roboto Mono's. */
const LABEL_FONT_FILES: Record<LabelFace, FontFiles> = {
  'figures': FIGURES,
  'figures-bold': FIGURES_BOLD,
  'words': ['barlow-600.woff', 'barlow-latin-ext-600.woff', 'barlow-vietnamese-600.woff', ...FIGURES],
  'words-bold': ['barlow-700.woff', 'barlow-latin-ext-700.woff', 'barlow-vietnamese-700.woff', ...FIGURES_BOLD],
}

function ofWeight(weight: 500 | 700): FontFiles {
  return [`roboto-mono-${weight}.woff`, ...['latin-ext', 'greek', 'cyrillic', 'cyrillic-ext', 'vietnamese'].map(letters => `roboto-mono-${letters}-${weight}.woff`)]
}

/**
 * The font files that the papers are set in, from the server's own assets.
 *
 * Errors: Error where the build has left one out.
 */
export function labelFonts(): Promise<LabelFonts> {
  const assets = useStorage('assets:server')
  return facesFrom(async (file) => {
    const bytes = await assets.getItemRaw<Uint8Array>(`fonts/${file}`)
    if (!bytes) throw new Error(`The font ${file} is missing from the server's assets`)
    return Buffer.from(bytes)
  })
}

/** The four faces, each file read once. */
export async function facesFrom(read: (file: string) => Promise<Buffer>): Promise<LabelFonts> {
  const names = [...new Set(Object.values(LABEL_FONT_FILES).flat())]
  const files = new Map(await Promise.all(names.map(async name => [name, await read(name)] as const)))
  const faces = Object.entries(LABEL_FONT_FILES) as [LabelFace, FontFiles][]
  return Object.fromEntries(faces.map(([face, of]) => [face, of.map(file => files.get(file)!)])) as unknown as LabelFonts
}
