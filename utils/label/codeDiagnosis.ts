import { LABEL_CODE_LENGTH, LABEL_SYMBOLS, isLabelCode, labelCodeGroups, readAsSymbols } from './code'

/** One of the three groups of a code: its place (1 to 3), as typed, and whether a common slip there would explain the check. */
export interface CodeGroup {
  place: number
  text: string
  likely: boolean
}

/** What can be told of a typed code: it is whole, still being typed, or something in it is to be compared with the label. */
export type CodeDiagnosis
  = | { state: 'whole', code: string }
    | { state: 'typing', missing: number }
    | { state: 'too-many', extra: number }
    | { state: 'strange-characters', characters: string[], groups: CodeGroup[] }
    | { state: 'compare', groups: CodeGroup[], nearCodes: string[] }

/** Symbols that are taken for one another on a scratched or oily label (common practice, no source). */
const LOOK_ALIKES = ['0DQ', '17', '2Z', '3B8', '5S', '6G', '8B', 'VY', 'CG', 'MN', 'KX', 'EF', 'PR', '4A', 'VW']

/**
 * What to tell a person who types a code: how many characters are missing, which are on no label, or which
 * groups to compare with the label because the check character does not fit the others.
 *
 * Shape: the text of the field in; groups in the order of the label. Where one swap of neighbours or one look-alike
 * would explain the check, its groups are marked as likely; where none would, all three are to be compared and none is marked.
 * `nearCodes` are the codes one slip away: those of them that the fleet knows are worth offering.
 */
export function codeDiagnosis(text: string): CodeDiagnosis {
  const typed = readAsSymbols(text)
  const strange = [...typed].filter(character => !LABEL_SYMBOLS.includes(character))
  if (strange.length > 0) {
    return {
      state: 'strange-characters',
      characters: [...new Set(strange)],
      groups: groupsOf(typed, index => !LABEL_SYMBOLS.includes(typed.charAt(index))),
    }
  }
  if (typed.length < LABEL_CODE_LENGTH) return { state: 'typing', missing: LABEL_CODE_LENGTH - typed.length }
  if (typed.length > LABEL_CODE_LENGTH) return { state: 'too-many', extra: typed.length - LABEL_CODE_LENGTH }
  if (isLabelCode(typed)) return { state: 'whole', code: typed }

  const slips = slipsThatExplain(typed)
  const suspects = new Set(slips.filter(slip => slip.common).flatMap(slip => slip.places))
  return {
    state: 'compare',
    groups: groupsOf(typed, index => suspects.has(index)),
    nearCodes: [...new Set(slips.map(slip => slip.code))],
  }
}

interface Slip {
  code: string
  places: number[]
  common: boolean
}

/** The codes that one swap of neighbours or one wrong character turns into what was typed, common slips first. */
function slipsThatExplain(typed: string): Slip[] {
  const swaps: Slip[] = []
  const replacements: Slip[] = []
  for (let index = 0; index < typed.length; index++) {
    const [before, at, next] = [typed.slice(0, index), typed.charAt(index), typed.charAt(index + 1)]
    if (next !== '' && next !== at) {
      swaps.push({ code: before + next + at + typed.slice(index + 2), places: [index, index + 1], common: true })
    }
    for (const symbol of LABEL_SYMBOLS) {
      if (symbol === at) continue
      const common = LOOK_ALIKES.some(set => set.includes(symbol) && set.includes(at))
      replacements.push({ code: before + symbol + typed.slice(index + 1), places: [index], common })
    }
  }
  const explaining = [...swaps, ...replacements].filter(slip => isLabelCode(slip.code))
  return [...explaining.filter(slip => slip.common), ...explaining.filter(slip => !slip.common)]
}

function groupsOf(typed: string, isSuspect: (index: number) => boolean): CodeGroup[] {
  return labelCodeGroups(typed).map((text, group) => ({
    place: group + 1,
    text,
    likely: [...text].some((_, offset) => isSuspect(group * 3 + offset)),
  }))
}
